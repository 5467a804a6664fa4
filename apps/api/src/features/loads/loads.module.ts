import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { BottlesModule } from '../bottles/bottles.module.js';
import { DecisionsService } from './decisions.service.js';
import { LoadsController } from './loads.controller.js';
import { LoadsRepository } from './loads.repository.js';
import { LoadsService } from './loads.service.js';

@Module({
  imports: [AlertsModule, BottlesModule],
  controllers: [LoadsController],
  providers: [LoadsService, DecisionsService, LoadsRepository],
  exports: [LoadsService, DecisionsService],
})
export class LoadsModule {}
