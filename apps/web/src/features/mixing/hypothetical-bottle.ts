import {
  assess,
  type Assessment,
  type ChemistryDocument,
  type Container,
  fold,
  localDate,
  type Material,
} from '@wetside/chemistry';
import type { Darkroom } from '../../shared/api/types.js';

interface Mix {
  document: ChemistryDocument;
  volumeUl: number;
  container: Container;
  material: Material | null;
  happenedAt: string;
}

/** How the bottle would stand if it were mixed so: by the same rule as a real one. */
export function hypotheticalBottle(mix: Mix, darkroom: Darkroom, now: string): Assessment | null {
  const { zone, thresholds } = darkroom;
  const { smallestTankUl } = thresholds;
  const { document, volumeUl, container, material, happenedAt } = mix;
  const happenedOn = localDate(happenedAt, zone);
  const place = { actionId: 'not recorded', seq: 0, happenedAt, happenedOn };
  const totals = fold(document, [{ ...place, kind: 'mix', volumeUl, container, material }]);
  const today = localDate(now, zone);
  return totals && assess(document, totals, { now, today, zone, smallestTankUl, thresholds });
}
