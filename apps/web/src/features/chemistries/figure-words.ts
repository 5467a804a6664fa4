import {
  type CapacityFigure,
  type ChemistryDocument,
  type KeepingFigure,
  roundLeftDown,
} from '@wetside/chemistry';
import { countOf } from '../../shared/formats/amounts.js';
import { sourceWords } from '../../shared/formats/source-words.js';

const stateWords: Record<KeepingFigure['state'], string> = {
  full: 'in a full bottle',
  'part-full': 'in a part-full bottle',
  'floating-lid': 'under a floating lid',
  'open-tray': 'in an open tray',
};
const materialWords = { film: 'film', 'rc-paper': 'RC prints', 'fb-paper': 'FB prints' } as const;

export interface FigureWords {
  words: string;
  source: string;
}

const capacityWords = (figure: CapacityFigure, material: keyof typeof materialWords): string =>
  `${roundLeftDown(figure.rollsE4)} ${material === 'film' ? 'rolls' : '8×10'} ${
    figure.per === 'litre' ? 'a litre' : 'a bottle'
  }, ${materialWords[material]}`;

const keepingWords = ({ keeps, state, from }: KeepingFigure): string =>
  `${countOf(keeps.count, keeps.unit.replace(/s$/, ''))} ${stateWords[state]}${
    from === 'first-use' ? ', from first use' : ''
  }`;

/** Every figure of capacity and keeping, each with where it was read. */
export function figureWords(document: ChemistryDocument): FigureWords[] {
  const source = (key: string): string => sourceWords(document, [key]).join('');
  const capacity = document.materials.flatMap(({ material, capacity: figures }) =>
    figures.map((figure) => ({ words: capacityWords(figure, material), source: source(figure.source) })),
  );
  const keeping = document.keeping.map((figure) => ({
    words: keepingWords(figure),
    source: source(figure.source),
  }));
  return [...capacity, ...keeping];
}
