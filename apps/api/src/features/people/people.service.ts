import { Injectable } from '@nestjs/common';
import type { CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import type { MembershipView } from './people.dto.js';
import { PeopleRepository } from './people.repository.js';

@Injectable()
export class PeopleService {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly repository: PeopleRepository,
  ) {}

  list(caller: CallerInfo, darkroom: string): Promise<MembershipView[]> {
    return this.access.enter(caller, darkroom, async (tx, me) => {
      const rows = await this.repository.current(tx, me.darkroomId);
      return rows.map(({ joinedAt, ...row }) => ({ ...row, joinedAt: joinedAt.toISOString() }));
    });
  }
}
