import { localDate, type LocalDate } from '@wetside/chemistry';
import type { ActionKind } from '@wetside/db';
import type { Me } from '../auth/me.js';
import type { Tx } from '../database/database.js';
import type { ActionsRepository } from './actions.repository.js';
import type { Happened } from './happened.js';

interface Facts {
  id: string;
  kind: ActionKind;
  v: number;
  when: Happened;
  now: Date;
  today: LocalDate;
  requestHash: string;
  queued: boolean;
}

/** One action on its way into the ledger. */
export class Recording {
  private at: Date;
  private place: number | null = null;

  constructor(
    private readonly repository: ActionsRepository,
    readonly me: Me,
    private readonly facts: Facts,
  ) {
    this.at = facts.when.at;
  }

  get darkroomId(): string {
    return this.me.darkroomId;
  }
  get id(): string {
    return this.facts.id;
  }
  get kind(): ActionKind {
    return this.facts.kind;
  }
  get now(): Date {
    return this.facts.now;
  }
  /** The darkroom's date now. */
  get today(): LocalDate {
    return this.facts.today;
  }
  get when(): Happened {
    return this.facts.when;
  }
  get happenedAt(): Date {
    return this.at;
  }
  /** The darkroom's date when it happened. */
  get happenedOn(): LocalDate {
    return localDate(this.at.toISOString(), this.me.zone);
  }
  /** The server's place in the order; known once it was added. */
  get seq(): number {
    if (this.place === null) throw new Error('The action has not been added yet.');
    return this.place;
  }

  /** Moves it to a time that the ledger can place, before it is added (a load told for before the mix). */
  moveTo(at: Date): void {
    if (this.place !== null) throw new Error('An added action does not move.');
    this.at = at;
  }

  /** Writes the action's row. Call it once, after the row locks are taken, so that its place follows theirs. */
  async add(tx: Tx): Promise<void> {
    this.place = await this.repository.insert(tx, {
      darkroomId: this.darkroomId,
      id: this.id,
      kind: this.kind,
      v: this.facts.v,
      happenedAt: this.at,
      happenedOn: this.happenedOn,
      recordedAt: this.facts.now,
      membershipId: this.me.membershipId,
      requestHash: this.facts.requestHash,
      queued: this.facts.queued,
    });
  }
}
