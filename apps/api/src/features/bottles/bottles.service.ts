import { Injectable } from '@nestjs/common';
import { localDate } from '@wetside/chemistry';
import type { Me } from '../../platform/auth/me.js';
import { Clock } from '../../platform/clock/clock.js';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { toBottleView, type BottlesAnswer, type BottleView } from './bottle.view.js';
import { BottlesRepository } from './bottles.repository.js';

@Injectable()
export class BottlesService {
  constructor(
    private readonly repository: BottlesRepository,
    private readonly clock: Clock,
  ) {}

  async list(tx: Tx, me: Me, which: 'in-use' | 'all'): Promise<BottlesAnswer> {
    const rows = await this.repository.details(tx, me.darkroomId, which);
    return {
      bottles: rows.map(toBottleView),
      versions: Object.fromEntries(rows.map((row) => [row.chemistryVersionId, row.document])),
      today: localDate(this.clock.nowIso(), me.zone),
    };
  }

  /** @throws Problem 'not-found' */
  async one(tx: Tx, me: Me, idOrCode: string) {
    const id = await this.repository.findId(tx, me.darkroomId, idOrCode);
    const [row] = id ? await this.repository.details(tx, me.darkroomId, { ids: [id] }) : [];
    if (!row?.totals) throw problem('not-found');
    return {
      bottle: toBottleView(row),
      document: row.document,
      today: localDate(this.clock.nowIso(), me.zone),
    };
  }

  /** These bottles by code; those whose mix was taken back are left out. */
  async views(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<BottleView[]> {
    if (ids.length === 0) return [];
    const rows = await this.repository.details(tx, darkroomId, { ids });
    return rows.filter((row) => row.totals !== null).map(toBottleView);
  }
}
