import { Injectable } from '@nestjs/common';
import type { AssessContext } from '@wetside/chemistry';
import type { Tx } from '../../platform/database/database.js';
import { HouseRepository, type House } from '../../platform/house/house.repository.js';
import { NextCheck } from '../../platform/jobs/next-check.js';
import type { Touched } from '../../platform/ledger/void-handlers.js';
import { contextOf, judge } from './conditions.js';
import type { Cause } from './crossing.js';
import { crossingsOf, isChange, type Crossings } from './crossings.js';
import { EventsRepository } from './events.repository.js';
import { FactsRepository } from './facts.repository.js';
import { WarningMails } from './warning-mails.service.js';

/** Where, when and why something moved. */
export interface SettleAt {
  darkroomId: string;
  zone: string;
  now: Date;
  cause: Cause;
}

const isNone = ({ bottleIds, packIds, loadActionIds }: Touched): boolean =>
  bottleIds.length + packIds.length + loadActionIds.length === 0;

/** Raises and ends warnings. */
@Injectable()
export class WarningsService {
  constructor(
    private readonly houses: HouseRepository,
    private readonly facts: FactsRepository,
    private readonly events: EventsRepository,
    private readonly mails: WarningMails,
    private readonly nextCheck: NextCheck,
  ) {}

  /**
   * The last thing of every action, in its transaction: brings the warnings about what it moved in line with how that
   * stands now. The bottles' totals must be locked and written by then. It ends with the darkroom's own row, after
   * which nothing may be locked.
   */
  async settle(tx: Tx, at: SettleAt, touched: Touched): Promise<void> {
    if (isNone(touched)) return;
    const house = await this.houses.read(tx, at.darkroomId);
    const context = contextOf({ ...house, zone: at.zone }, at.now);
    await this.events.lockPacks(tx, at.darkroomId, touched.packIds);
    let list = await this.look(tx, at, touched, context);
    const looks = list.flatMap(({ subject }) => (subject.nextLookAt ? [new Date(subject.nextLookAt)] : []));
    if (list.some(isChange)) {
      // Another action may have been at the same events: they are judged under their locks.
      await this.events.lock(
        tx,
        at.darkroomId,
        list.map(({ subject }) => subject.id),
      );
      list = await this.look(tx, at, touched, context);
      const due = await this.change(tx, at, house, context, list.filter(isChange));
      if (due) looks.push(due);
    }
    await this.nextCheck.lower(tx, at.darkroomId, earliest(looks));
  }

  private async look(tx: Tx, at: SettleAt, touched: Touched, context: AssessContext): Promise<Crossings[]> {
    const facts = await this.facts.read(tx, at.darkroomId, touched);
    return judge(facts, context).map((subject) => crossingsOf(subject, facts.events, at));
  }

  /** @returns when the first mail falls due */
  private async change(
    tx: Tx,
    { darkroomId, now, cause }: SettleAt,
    house: House,
    context: AssessContext,
    list: readonly Crossings[],
  ): Promise<Date | null> {
    const opened = list.flatMap((one) => one.opened);
    const taken = await this.events.open(tx, opened);
    await this.events.reopen(
      tx,
      darkroomId,
      list.flatMap((one) => one.reopened),
    );
    await this.events.end(
      tx,
      darkroomId,
      list.flatMap((one) => one.ended),
      now,
      cause,
    );
    const lost = new Set(opened.map(({ id }) => id).filter((id) => !taken.has(id)));
    const settled = list.map((one) => ({ ...one, open: one.open.filter(({ id }) => !lost.has(id)) }));
    return this.mails.follow(tx, { house, now, day: context }, settled);
  }
}

function earliest(dates: readonly Date[]): Date | null {
  return dates.reduce<Date | null>((first, date) => (first === null || date < first ? date : first), null);
}
