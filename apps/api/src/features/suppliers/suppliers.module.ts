import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { PackLocks } from './pack-locks.js';
import { SettingChangesService } from './setting-changes.service.js';
import { SuppliersController } from './suppliers.controller.js';
import { SuppliersRepository } from './suppliers.repository.js';
import { SuppliersService } from './suppliers.service.js';

@Module({
  imports: [AlertsModule],
  controllers: [SuppliersController],
  providers: [SuppliersService, SettingChangesService, SuppliersRepository, PackLocks],
  exports: [SuppliersService, PackLocks],
})
export class SuppliersModule {}
