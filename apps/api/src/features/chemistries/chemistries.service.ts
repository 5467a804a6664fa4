import { Injectable } from '@nestjs/common';
import { roleLetters, roles } from '@wetside/chemistry';
import type { Me } from '../../platform/auth/me.js';
import type { Tx } from '../../platform/database/database.js';
import { ChemistriesRepository } from './chemistries.repository.js';
import type { ChemistriesAnswer } from './chemistry.view.js';

/** FX-01: two letters by role, a number of two figures and more. */
export const bottleCode = (letters: string, number: number): string =>
  `${letters}-${String(number).padStart(2, '0')}`;

@Injectable()
export class ChemistriesService {
  constructor(private readonly repository: ChemistriesRepository) {}

  /** In the order of a line, then by name. */
  async list(tx: Tx, me: Me): Promise<ChemistriesAnswer> {
    const versions = await this.repository.current(tx, me.darkroomId);
    const packs = await this.repository.fromPacks(tx, me.darkroomId);
    const letters = [...new Set(versions.map((version) => roleLetters[version.document.role]))];
    const last = await this.repository.lastNumbers(tx, me.darkroomId, letters);
    const views = versions.map((version) => {
      const code = roleLetters[version.document.role];
      return {
        id: version.chemistryId,
        versionId: version.id,
        number: version.number,
        document: version.document,
        nextCode: bottleCode(code, (last.get(code) ?? 0) + 1),
        from: packs.flatMap(({ chemistryId, volumeUl, ...pack }) =>
          chemistryId === version.chemistryId && volumeUl !== null ? [{ ...pack, volumeUl }] : [],
        ),
      };
    });
    const rank = (role: (typeof roles)[number]): number => roles.indexOf(role);
    return {
      chemistries: views.sort(
        (a, b) =>
          rank(a.document.role) - rank(b.document.role) || a.document.name.localeCompare(b.document.name),
      ),
    };
  }
}
