import { Module } from '@nestjs/common';
import { AlertsModule } from '../alerts/alerts.module.js';
import { OrdersModule } from '../orders/orders.module.js';
import { SuppliersModule } from '../suppliers/suppliers.module.js';
import { ReceiptVoids } from './receipt-voids.js';
import { ReceiptsService } from './receipts.service.js';
import { ShelfController } from './shelf.controller.js';
import { ShelfRepository } from './shelf.repository.js';
import { ShelfService } from './shelf.service.js';
import { StockHistoryRepository } from './stock-history.repository.js';
import { StockRepository } from './stock.repository.js';
import { StockService } from './stock.service.js';

@Module({
  imports: [AlertsModule, OrdersModule, SuppliersModule],
  controllers: [ShelfController],
  providers: [
    ShelfService,
    ReceiptsService,
    ReceiptVoids,
    StockService,
    ShelfRepository,
    StockRepository,
    StockHistoryRepository,
  ],
  exports: [ShelfService, StockService],
})
export class ShelfModule {}
