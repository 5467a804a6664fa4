import { Module } from '@nestjs/common';
import { DarkroomsModule } from '../darkrooms/darkrooms.module.js';
import { ChemistriesController } from './chemistries.controller.js';
import { ChemistriesRepository } from './chemistries.repository.js';
import { ChemistriesService } from './chemistries.service.js';
import { ChemistryDocuments } from './chemistry-documents.js';
import { StarterService } from './starter.service.js';

@Module({
  imports: [DarkroomsModule],
  controllers: [ChemistriesController],
  providers: [ChemistriesRepository, ChemistryDocuments, ChemistriesService, StarterService],
  exports: [ChemistriesRepository, ChemistryDocuments],
})
export class ChemistriesModule {}
