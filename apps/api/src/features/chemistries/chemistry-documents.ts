import { Injectable } from '@nestjs/common';
import type { ChemistryDocument } from '@wetside/chemistry';
import type { Tx } from '../../platform/database/database.js';
import { ChemistriesRepository } from './chemistries.repository.js';

/** Some kilobytes each; a darkroom has a dozen in use. Beyond that the one that was read first is forgotten. */
const MOST = 2_000;

/**
 * The documents of chemistry versions, kept once they were read: a version never changes. Whoever asks has the
 * version's id from a row that row security showed them.
 */
@Injectable()
export class ChemistryDocuments {
  private readonly kept = new Map<string, ChemistryDocument>();

  constructor(private readonly repository: ChemistriesRepository) {}

  /** These rows, in their order, each with its version's document. */
  async with<R extends { chemistryVersionId: string }>(
    tx: Tx,
    darkroomId: string,
    rows: readonly R[],
  ): Promise<(R & { document: ChemistryDocument })[]> {
    const keyOf = (versionId: string): string => `${darkroomId} ${versionId}`;
    const ids = [...new Set(rows.map((row) => row.chemistryVersionId))];
    const found = new Map(ids.map((id) => [id, this.kept.get(keyOf(id))]));
    const missing = ids.filter((id) => found.get(id) === undefined);
    if (missing.length > 0) {
      for (const { id, document } of await this.repository.documents(tx, darkroomId, missing)) {
        found.set(id, document);
        this.keep(keyOf(id), document);
      }
    }
    return rows.map((row) => {
      const document = found.get(row.chemistryVersionId);
      if (!document) throw new Error(`There is no chemistry version ${row.chemistryVersionId} here.`);
      return { ...row, document };
    });
  }

  private keep(key: string, document: ChemistryDocument): void {
    const [first] = this.kept.keys();
    if (this.kept.size >= MOST && first !== undefined) this.kept.delete(first);
    this.kept.set(key, document);
  }
}
