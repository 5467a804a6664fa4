import type { ChemistryDocument, Source } from '@wetside/chemistry';

const kinds: Record<Source['kind'], string> = {
  published: 'published',
  'second-hand': 'second-hand',
  'common-practice': 'common practice',
  memory: 'from memory: check your sheet',
  darkroom: 'set by this darkroom',
};

function oneSource({ kind, text }: Source): string {
  const [start = ''] = kinds[kind].split(':');
  return text.toLowerCase().startsWith(start) ? text : `${text} (${kinds[kind]})`;
}

/** Where a figure was read, in words, for each key that the document knows. */
export const sourceWords = (document: ChemistryDocument, keys: readonly string[]): string[] =>
  [...new Set(keys)].flatMap((key) => {
    const source = document.sources[key];
    return source ? [oneSource(source)] : [];
  });
