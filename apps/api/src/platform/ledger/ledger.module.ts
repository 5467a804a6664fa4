import { Global, Module } from '@nestjs/common';
import { APP_INTERCEPTOR } from '@nestjs/core';
import { ActionViews } from './action-views.js';
import { ActionRecorder } from './action-recorder.js';
import { ActionsRepository } from './actions.repository.js';
import { RecordedInterceptor } from './recorded.interceptor.js';
import { VoidHandlers } from './void-handlers.js';

@Global()
@Module({
  providers: [
    ActionViews,
    ActionRecorder,
    ActionsRepository,
    VoidHandlers,
    { provide: APP_INTERCEPTOR, useClass: RecordedInterceptor },
  ],
  exports: [ActionViews, ActionRecorder, ActionsRepository, VoidHandlers],
})
export class LedgerModule {}
