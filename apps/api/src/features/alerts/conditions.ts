import {
  assess,
  localDate,
  type AssessContext,
  type Assessment,
  type Condition,
  type StepFlag,
} from '@wetside/chemistry';
import type { EventKind } from '@wetside/db';
import type { House } from '../../platform/house/house.repository.js';
import type { AlertFacts, BottleFacts, LoadFacts, PackFacts } from './alert-facts.js';

/** A bottle, pack or load with the warnings that hold about it now. */
export type Subject = {
  id: string;
  /** Every kind that is judged here; an event of another kind is left alone. */
  judged: readonly EventKind[];
  holds: readonly EventKind[];
  /** Rows on the screen, never mail. */
  neverMail: boolean;
  /** When time alone would change the judgement: an instant, ISO. */
  nextLookAt: string | null;
} & (
  | { of: 'bottle'; facts: BottleFacts; assessment: Assessment | null }
  | { of: 'pack'; facts: PackFacts }
  | { of: 'load'; facts: LoadFacts }
);

const BOTTLE_KINDS: readonly EventKind[] = ['past-date', 'spent', 'on-hold', 'low', 'near-date'];
const PACK_KINDS: readonly EventKind[] = ['none-on-shelf', 'reorder-point'];
const LOAD_KINDS: readonly EventKind[] = ['load-to-decide'];

const kindOf = (condition: Condition): EventKind => (condition === 'near' ? 'near-date' : condition);

export function bottleSubject(facts: BottleFacts, context: AssessContext): Subject {
  const assessment = facts.totals && assess(facts.document, facts.totals, context);
  return {
    of: 'bottle',
    id: facts.id,
    facts,
    assessment,
    judged: BOTTLE_KINDS,
    holds: assessment?.conditions.map(kindOf) ?? [],
    neverMail: facts.document.cheapToRenew,
    nextLookAt: assessment?.nextLookAt ?? null,
  };
}

/** "None on the shelf" looks at the shelf alone, the reorder point also at what is on order. */
export function packSubject(facts: PackFacts): Subject {
  const { unopened, onOrder, reorderPoint } = facts;
  const holds: EventKind[] = [];
  if (reorderPoint !== null && unopened === 0) holds.push('none-on-shelf');
  if (reorderPoint !== null && unopened + onOrder <= reorderPoint) holds.push('reorder-point');
  return { of: 'pack', id: facts.id, facts, judged: PACK_KINDS, holds, neverMail: false, nextLookAt: null };
}

const TO_DECIDE: readonly StepFlag[] = [
  'past_date',
  'on_hold',
  'after_discard',
  'incompatible',
  'wrong_material',
];

/** The flags that a technician must look at; how full a bottle was shows in the bottle's own row. */
export const flagsToDecide = (flags: readonly StepFlag[]): StepFlag[] =>
  TO_DECIDE.filter((flag) => flags.includes(flag));

export function loadSubject(facts: LoadFacts): Subject {
  const open =
    !facts.voided && !facts.decided && facts.steps.some(({ flags }) => flagsToDecide(flags).length > 0);
  return {
    of: 'load',
    id: facts.id,
    facts,
    judged: LOAD_KINDS,
    holds: open ? LOAD_KINDS : [],
    neverMail: false,
    nextLookAt: null,
  };
}

/** What the judgement of a bottle needs beside the bottle. */
export function contextOf(house: House, now: Date): AssessContext {
  const { zone, thresholds, smallestTankUl } = house;
  const nowIso = now.toISOString();
  return { now: nowIso, today: localDate(nowIso, zone), zone, thresholds, smallestTankUl };
}

export function judge(facts: AlertFacts, context: AssessContext): Subject[] {
  return [
    ...facts.bottles.map((bottle) => bottleSubject(bottle, context)),
    ...facts.packs.map(packSubject),
    ...facts.loads.map(loadSubject),
  ];
}
