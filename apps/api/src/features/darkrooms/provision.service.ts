import { Injectable } from '@nestjs/common';
import { v7 } from 'uuid';
import { Clock } from '../../platform/clock/clock.js';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { DarkroomsRepository } from './darkrooms.repository.js';
import { HOUSE_RULES, isShortName, isZone } from './house-rules.js';

export interface NewDarkroom {
  /** The transaction must be inside this darkroom (Database.inDarkroom) before it is there. */
  darkroomId: string;
  shortName: string;
  name: string;
  zone: string;
  manager: { personId: string; displayName: string };
  /** Where they differ from the usual ones. */
  settings?: Partial<typeof HOUSE_RULES>;
}

export interface Provisioned {
  darkroomId: string;
  /** The manager's membership. */
  membershipId: string;
}

/** Something else a new darkroom starts with, such as its first chemistries; it runs in the same transaction. */
export type ProvisionStep = (tx: Tx, provisioned: Provisioned) => Promise<void>;

@Injectable()
export class ProvisionService {
  private readonly steps: ProvisionStep[] = [];

  constructor(
    private readonly clock: Clock,
    private readonly repository: DarkroomsRepository,
  ) {}

  /** Features add what a new darkroom starts with as their module begins; steps run in the order they came. */
  startsWith(step: ProvisionStep): void {
    this.steps.push(step);
  }

  /**
   * A new darkroom with its rules and its first manager, all in the transaction given.
   * @throws Problem 'invalid' for a short name or zone that cannot be; a unique violation on darkrooms_short_name.
   */
  async provisionDarkroom(tx: Tx, order: NewDarkroom): Promise<Provisioned> {
    const { darkroomId, shortName, name, zone, manager, settings } = order;
    if (!isShortName(shortName)) throw problem('short-name-shape');
    if (!isZone(zone)) throw problem('zone-unknown', zone);
    const now = this.clock.now();
    const membershipId = v7();
    await this.repository.add(tx, { id: darkroomId, shortName, name, zone, createdAt: now });
    await this.repository.addSettings(tx, { darkroomId, ...HOUSE_RULES, ...settings });
    await this.repository.addMembership(tx, {
      darkroomId,
      id: membershipId,
      personId: manager.personId,
      role: 'manager',
      displayName: manager.displayName,
      joinedAt: now,
    });
    for (const step of this.steps) await step(tx, { darkroomId, membershipId });
    return { darkroomId, membershipId };
  }
}
