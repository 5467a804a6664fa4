import type { ChemistryDocument } from './document.js';
import { chemistryDocumentSchema } from './document-schema.js';
import { faultIn } from './schema.js';

/** The message says where the document is not one, as a path into it. */
export class ChemistryDocumentError extends Error {
  override name = 'ChemistryDocumentError';
}

/** Every place where a figure names its source, wherever it stands in the document. */
function sourceKeys(value: unknown, at: string): { key: string; at: string }[] {
  if (Array.isArray(value)) return value.flatMap((member, index) => sourceKeys(member, `${at}/${index}`));
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, member]: [string, unknown]) => {
    if (key === 'source' && typeof member === 'string') return [{ key: member, at: `${at}/source` }];
    return key === 'sources' && at === '' ? [] : sourceKeys(member, `${at}/${key}`);
  });
}

function fits(value: unknown): value is ChemistryDocument {
  const fault = faultIn(chemistryDocumentSchema, value);
  if (fault) throw new ChemistryDocumentError(fault);
  return true;
}

function checkOnce(document: ChemistryDocument): void {
  const named = document.materials.map((use) => use.material);
  const twice = named.findIndex((material, index) => named.indexOf(material) !== index);
  if (twice >= 0) throw new ChemistryDocumentError(`/materials/${twice} names a material a second time`);
  if (document.dilution.kind === 'percent' && document.dilution.wantE4 > document.dilution.haveE4) {
    throw new ChemistryDocumentError('/dilution/wantE4 is stronger than what it is made of');
  }
}

/** The document, or ChemistryDocumentError saying where it is not one. Reads every schema ever written (so far 1). */
export function parseChemistryDocument(value: unknown): ChemistryDocument {
  if (!fits(value)) throw new ChemistryDocumentError('the document is not one');
  for (const { key, at } of sourceKeys(value, '')) {
    if (!Object.hasOwn(value.sources, key)) {
      throw new ChemistryDocumentError(`${at} names no source of the document: ${key}`);
    }
  }
  checkOnce(value);
  return value;
}
