import { Injectable, type OnModuleInit } from '@nestjs/common';
import { starterCatalogue } from '@wetside/chemistry';
import { defaultRule } from '@wetside/supply';
import { v7 } from 'uuid';
import { Clock } from '../../platform/clock/clock.js';
import type { Tx } from '../../platform/database/database.js';
import { ProvisionService } from '../darkrooms/provision.service.js';
import { ChemistriesRepository } from './chemistries.repository.js';
import { starterPacks, type StarterPack } from './starter-packs.js';

/** Gives a new darkroom the starter catalogue: its chemistries and the packs they are bought in. */
@Injectable()
export class StarterService implements OnModuleInit {
  constructor(
    private readonly provision: ProvisionService,
    private readonly repository: ChemistriesRepository,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.provision.startsWith((tx, { darkroomId }) => this.install(tx, darkroomId));
  }

  private async install(tx: Tx, darkroomId: string): Promise<void> {
    const createdAt = this.clock.now();
    const chemistryIds = new Map<string, string>();
    for (const { key, document } of starterCatalogue) {
      const id = v7();
      chemistryIds.set(key, id);
      await this.repository.insertChemistry(
        tx,
        { darkroomId, id, createdAt },
        { darkroomId, id: v7(), chemistryId: id, number: 1, document, createdAt },
      );
    }
    for (const pack of starterPacks) await this.installPack(tx, darkroomId, pack, chemistryIds);
  }

  private async installPack(
    tx: Tx,
    darkroomId: string,
    pack: StarterPack,
    chemistryIds: ReadonlyMap<string, string>,
  ): Promise<void> {
    const chemistryId = chemistryIds.get(pack.makes);
    if (!chemistryId)
      throw new Error(`The starter pack ${pack.name} makes nothing of the starter catalogue.`);
    const packId = v7();
    const { name, form, keepsUnopenedMonths, wholeOnly } = pack;
    await this.repository.insertPack(
      tx,
      {
        darkroomId,
        id: packId,
        name,
        form,
        keepsUnopenedMonths,
        reorderPoint: defaultRule.reorderPoint,
        reorderUpTo: defaultRule.upTo,
      },
      pack.parts.map((part, position) => ({
        darkroomId,
        id: v7(),
        packId,
        position,
        name: part.name,
        sizeUl: part.sizeUl ?? null,
        sizeMg: part.sizeMg ?? null,
        keepsOpenedMonths: part.keepsOpenedMonths,
      })),
      [{ darkroomId, id: v7(), packId, chemistryId, volumeUl: pack.makesUl, wholeOnly }],
    );
  }
}
