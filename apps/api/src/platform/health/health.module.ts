import { Module } from '@nestjs/common';
import { FinishRequests } from './finish-requests.js';
import { HealthController } from './health.controller.js';
import { ReadyController } from './ready.controller.js';

@Module({ controllers: [HealthController, ReadyController], providers: [FinishRequests] })
export class HealthModule {}
