import { Module } from '@nestjs/common';
import { DarkroomsModule } from '../darkrooms/darkrooms.module.js';
import { ChemistriesController } from './chemistries.controller.js';
import { ChemistriesRepository } from './chemistries.repository.js';
import { ChemistriesService } from './chemistries.service.js';
import { StarterService } from './starter.service.js';

@Module({
  imports: [DarkroomsModule],
  controllers: [ChemistriesController],
  providers: [ChemistriesRepository, ChemistriesService, StarterService],
  exports: [ChemistriesRepository],
})
export class ChemistriesModule {}
