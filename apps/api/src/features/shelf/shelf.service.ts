import { Injectable } from '@nestjs/common';
import { localDate } from '@wetside/chemistry';
import type { Me } from '../../platform/auth/me.js';
import { Clock } from '../../platform/clock/clock.js';
import type { Tx } from '../../platform/database/database.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import { OrdersService } from '../orders/orders.service.js';
import { SuppliersService } from '../suppliers/suppliers.service.js';
import { assembleShelf } from './shelf-assembly.js';
import { ShelfRepository } from './shelf.repository.js';
import type { ShelfView } from './shelf.view.js';

@Injectable()
export class ShelfService {
  constructor(
    private readonly clock: Clock,
    private readonly repository: ShelfRepository,
    private readonly suppliers: SuppliersService,
    private readonly orders: OrdersService,
  ) {}

  read(enter: Entrance): Promise<ShelfView> {
    return enter((tx, me) => this.shelf(tx, me));
  }

  /** Everything on the shelf: seven statements, whatever stands there. */
  async shelf(tx: Tx, { darkroomId, zone }: Me): Promise<ShelfView> {
    const packs = assembleShelf({
      packs: await this.repository.packs(tx, darkroomId),
      parts: await this.repository.parts(tx, darkroomId),
      makes: await this.repository.makes(tx, darkroomId),
      lots: await this.repository.lots(tx, darkroomId),
      opened: await this.repository.opened(tx, darkroomId),
      sold: await this.suppliers.soldNow(tx, darkroomId),
      onOrder: await this.orders.onOrder(tx, darkroomId),
    });
    return { packs, today: localDate(this.clock.nowIso(), zone) };
  }
}
