import { Module } from '@nestjs/common';
import { DarkroomNewService } from './darkroom-new.service.js';
import { DarkroomsController } from './darkrooms.controller.js';
import { DarkroomsRepository } from './darkrooms.repository.js';
import { DarkroomsService } from './darkrooms.service.js';
import { ProvisionService } from './provision.service.js';

@Module({
  controllers: [DarkroomsController],
  providers: [DarkroomsService, DarkroomsRepository, ProvisionService, DarkroomNewService],
  exports: [DarkroomsService, ProvisionService, DarkroomNewService],
})
export class DarkroomsModule {}
