import {
  assess,
  type Assessment,
  type ChemistryDocument,
  type LimitKind,
  localDate,
} from '@wetside/chemistry';
import type { BottleView, Darkroom } from '../../shared/api/types.js';

/** A bottle with its chemistry and how it stands now. */
export interface Standing {
  bottle: BottleView;
  document: ChemistryDocument;
  assessment: Assessment;
  /** The one sentence of the bottle, with the person's name where somebody holds it. */
  sentence: string;
}

function sentenceOf(bottle: BottleView, assessment: Assessment): string {
  const hold = bottle.totals.hold;
  if (assessment.verdict !== 'on-hold' || !hold) return assessment.sentence;
  return `On hold${bottle.holdBy ? ` by ${bottle.holdBy}` : ''}: ${hold.reason}`;
}

/** Asks the one rule of the program how a bottle stands. Nothing here decides anything. */
export function standingOf(
  bottle: BottleView,
  document: ChemistryDocument,
  darkroom: Darkroom,
  now: string,
): Standing {
  const { zone, thresholds } = darkroom;
  const today = localDate(now, zone);
  const assessment = assess(document, bottle.totals, {
    now,
    today,
    zone,
    smallestTankUl: thresholds.smallestTankUl,
    thresholds,
  });
  return { bottle, document, assessment, sentence: sentenceOf(bottle, assessment) };
}

const firstWords: Partial<Record<LimitKind, string>> = {
  capacity: 'Capacity gives out first.',
  date: 'Its date comes first.',
  volume: 'Volume gives out first.',
  test: 'The last test counts.',
};

/** What ends this bottle first, where its sentence does not say so already. */
export function limitWords({ assessment }: Standing): string | null {
  const { governs, closed, material, leftE4 } = assessment;
  if (closed || governs === null || material === null || leftE4[material] === null) return null;
  return firstWords[governs] ?? null;
}
