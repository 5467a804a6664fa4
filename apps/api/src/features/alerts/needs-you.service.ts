import { Injectable } from '@nestjs/common';
import type { CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { Clock } from '../../platform/clock/clock.js';
import { HouseRepository } from '../../platform/house/house.repository.js';
import { contextOf, judge } from './conditions.js';
import { EventsRepository } from './events.repository.js';
import { FactsRepository } from './facts.repository.js';
import { needsYouRows } from './needs-you-rows.js';
import type { NeedsYouView } from './needs-you.dto.js';

@Injectable()
export class NeedsYouService {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly clock: Clock,
    private readonly houses: HouseRepository,
    private readonly events: EventsRepository,
    private readonly facts: FactsRepository,
  ) {}

  list(caller: CallerInfo, darkroom: string): Promise<NeedsYouView> {
    return this.access.enter(caller, darkroom, async (tx, { darkroomId }) => {
      const open = await this.events.allOpen(tx, darkroomId);
      if (open.length === 0) return { open: [] };
      const facts = await this.facts.read(tx, darkroomId, {
        bottleIds: unique(open.map((event) => event.bottleId)),
        packIds: unique(open.map((event) => event.packId)),
        loadActionIds: unique(open.map((event) => event.loadActionId)),
      });
      const told = await this.events.told(
        tx,
        darkroomId,
        open.map(({ id }) => id),
      );
      const context = contextOf(await this.houses.read(tx, darkroomId), this.clock.now());
      return { open: needsYouRows(judge(facts, context), open, told, context) };
    });
  }
}

const unique = (ids: readonly (string | null)[]): string[] => [...new Set(ids.filter((id) => id !== null))];
