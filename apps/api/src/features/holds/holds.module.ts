import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { BottlesModule } from '../bottles/bottles.module.js';
import { HoldsController } from './holds.controller.js';
import { HoldsRepository } from './holds.repository.js';
import { HoldsService } from './holds.service.js';

@Module({
  imports: [AlertsModule, BottlesModule],
  controllers: [HoldsController],
  providers: [HoldsService, HoldsRepository],
  exports: [HoldsService],
})
export class HoldsModule {}
