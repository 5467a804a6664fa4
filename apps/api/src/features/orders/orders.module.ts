import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { SuppliersModule } from '../suppliers/suppliers.module.js';
import { DraftsService } from './drafts.service.js';
import { OrderDeliveries } from './order-deliveries.js';
import { OrderViews } from './order-views.js';
import { OrdersController } from './orders.controller.js';
import { OrdersRepository } from './orders.repository.js';
import { OrdersService } from './orders.service.js';
import { SendingService } from './sending.service.js';

@Module({
  imports: [AlertsModule, SuppliersModule],
  controllers: [OrdersController],
  providers: [OrdersService, DraftsService, SendingService, OrderViews, OrderDeliveries, OrdersRepository],
  exports: [OrdersService, OrderDeliveries],
})
export class OrdersModule {}
