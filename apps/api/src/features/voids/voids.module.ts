import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { BottlesModule } from '../bottles/bottles.module.js';
import { LogModule } from '../log/log.module.js';
import { VoidsController } from './voids.controller.js';
import { VoidsService } from './voids.service.js';

@Module({
  imports: [AlertsModule, BottlesModule, LogModule],
  controllers: [VoidsController],
  providers: [VoidsService],
  exports: [VoidsService],
})
export class VoidsModule {}
