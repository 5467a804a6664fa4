import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { BottlesModule } from '../bottles/bottles.module.js';
import { ChemistriesModule } from '../chemistries/chemistries.module.js';
import { ShelfModule } from '../shelf/shelf.module.js';
import { MixDraws } from './mix-draws.service.js';
import { MixVoids } from './mix-voids.service.js';
import { MixesController } from './mixes.controller.js';
import { MixesRepository } from './mixes.repository.js';
import { MixesService } from './mixes.service.js';

@Module({
  imports: [AlertsModule, BottlesModule, ChemistriesModule, ShelfModule],
  controllers: [MixesController],
  providers: [MixesService, MixDraws, MixVoids, MixesRepository],
  exports: [MixesService],
})
export class MixesModule {}
