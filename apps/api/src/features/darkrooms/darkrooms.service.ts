import { Injectable } from '@nestjs/common';
import type { CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import type { Me } from '../../platform/auth/me.js';
import type { Tx } from '../../platform/database/database.js';
import type { DarkroomView } from './darkrooms.dto.js';
import { DarkroomsRepository, type SettingsRow } from './darkrooms.repository.js';

@Injectable()
export class DarkroomsService {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly repository: DarkroomsRepository,
  ) {}

  /** The darkroom by its id or its short name. */
  find(caller: CallerInfo, darkroom: string): Promise<DarkroomView> {
    return this.access.enter(caller, darkroom, async (tx, me) =>
      view(me, await this.settings(tx, me.darkroomId)),
    );
  }

  /** The rules of the house, for features that are in the darkroom already. */
  async settings(tx: Tx, darkroomId: string): Promise<SettingsRow> {
    const row = await this.repository.settings(tx, darkroomId);
    if (!row) throw new Error(`Darkroom ${darkroomId} has no settings.`);
    return row;
  }
}

function view(me: Me, row: SettingsRow): DarkroomView {
  const { lowShareE4, lowRollsE4, nearDaysMax, nearShareE4, smallestTankUl } = row;
  return {
    id: me.darkroomId,
    shortName: me.shortName,
    name: me.darkroomName,
    zone: me.zone,
    units: { temperature: row.temperatureUnit, volume: row.volumeUnit },
    currency: row.currency,
    thresholds: { lowShareE4, lowRollsE4, nearDaysMax, nearShareE4, smallestTankUl },
    me: { membershipId: me.membershipId, role: me.role, displayName: me.displayName },
  };
}
