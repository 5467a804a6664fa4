import { Module } from '@nestjs/common';
import { ChemistriesModule } from '../chemistries/chemistries.module.js';
import { LogModule } from '../log/log.module.js';
import { BottleFactsRepository } from './bottle-facts.repository.js';
import { BottleLedger } from './bottle-ledger.js';
import { BottlesController } from './bottles.controller.js';
import { BottlesRepository } from './bottles.repository.js';
import { BottlesService } from './bottles.service.js';

/** The bottles, their ledger and their pages. */
@Module({
  imports: [ChemistriesModule, LogModule],
  controllers: [BottlesController],
  providers: [BottleLedger, BottleFactsRepository, BottlesRepository, BottlesService],
  exports: [BottleLedger, BottleFactsRepository, BottlesRepository, BottlesService],
})
export class BottlesModule {}
