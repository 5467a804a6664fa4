import type { ChemistryDocument, Source } from '@wetside/chemistry';

const kinds: Record<Source['kind'], string> = {
  published: 'published',
  'second-hand': 'second-hand',
  'common-practice': 'common practice',
  memory: 'from memory: check your sheet',
  darkroom: 'set by this darkroom',
};

/** Where a figure was read, in words, for each key that the document knows. */
export const sourceWords = (document: ChemistryDocument, keys: readonly string[]): string[] =>
  [...new Set(keys)].flatMap((key) => {
    const source = document.sources[key];
    return source ? [`${source.text} (${kinds[source.kind]})`] : [];
  });
