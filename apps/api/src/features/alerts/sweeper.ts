import { Injectable, Logger } from '@nestjs/common';
import { Clock } from '../../platform/clock/clock.js';
import { Database, type Tx } from '../../platform/database/database.js';
import { HouseRepository } from '../../platform/house/house.repository.js';
import { touched } from '../../platform/ledger/void-handlers.js';
import { OutgoingMail } from '../../platform/mail/outgoing-mail.service.js';
import { contextOf, judge } from './conditions.js';
import { FactsRepository } from './facts.repository.js';
import { SweepRepository, type Claimed } from './sweep.repository.js';
import { WarningsService } from './warnings.service.js';

/** Finds what time alone has brought about. Every server sweeps; no darkroom is swept by two at once. */
@Injectable()
export class Sweeper {
  private readonly log = new Logger(Sweeper.name);

  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly repository: SweepRepository,
    private readonly houses: HouseRepository,
    private readonly facts: FactsRepository,
    private readonly warnings: WarningsService,
    private readonly outgoing: OutgoingMail,
  ) {}

  /** One sweep over everything that is due. A darkroom that fails is left for later and keeps no other waiting. */
  async runOnce(): Promise<void> {
    for (;;) {
      const claimed = await this.database.asIdentity((tx) => this.repository.claim(tx, this.clock.now()));
      if (claimed.length === 0) return;
      for (const one of claimed) await this.sweepOrLeave(one);
    }
  }

  private async sweepOrLeave(claimed: Claimed): Promise<void> {
    const { darkroomId } = claimed;
    try {
      await this.database.inDarkroom({ darkroomId }, (tx) => this.sweep(tx, claimed));
    } catch (error) {
      this.log.error(
        `Darkroom ${darkroomId} could not be swept: ${error instanceof Error ? error.stack : String(error)}`,
      );
    }
  }

  private async sweep(tx: Tx, { darkroomId, zone }: Claimed): Promise<void> {
    const now = this.clock.now();
    const bottleIds = await this.repository.lockDueBottles(tx, darkroomId, now);
    if (bottleIds.length > 0) {
      await this.lookAt(tx, darkroomId, bottleIds, now);
      await this.warnings.settle(tx, { darkroomId, zone, now, cause: 'time' }, touched({ bottleIds }));
    }
    const due = await this.repository.dueMails(tx, darkroomId, now);
    await this.outgoing.remind(
      tx,
      due.map((id) => ({ darkroomId, id, dueAt: now })),
    );
    await this.repository.lookAgain(tx, darkroomId, now);
  }

  private async lookAt(tx: Tx, darkroomId: string, bottleIds: string[], now: Date): Promise<void> {
    const house = await this.houses.read(tx, darkroomId);
    const facts = await this.facts.read(tx, darkroomId, touched({ bottleIds }));
    const looks = judge(facts, contextOf(house, now)).map(({ id, nextLookAt }) => ({ id, nextLookAt }));
    await this.repository.writeNextLooks(tx, darkroomId, looks);
  }
}
