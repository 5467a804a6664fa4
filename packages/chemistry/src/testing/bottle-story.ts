import type { Container } from '../container.js';
import type { BottleFact, FactBase } from '../ledger.js';

type Detail = BottleFact extends infer F ? (F extends FactBase ? Omit<F, keyof FactBase> : never) : never;

/** A litre of glass. */
export const litreBottle: Container = { sizeUl: 1_000_000, kind: 'bottle', material: 'glass' };

/** A fresh litre for film. */
export const freshLitre = {
  kind: 'mix' as const,
  volumeUl: 1_000_000,
  container: litreBottle,
  material: 'film' as const,
} satisfies Detail;

/** Rolls of film through a bottle, in whole rolls. */
export const rolls = (count: number, takenUl = 0): Detail => ({
  kind: 'load',
  charges: [{ material: 'film', countedE4: count * 10_000, takenUl }],
});

/** A bottle's story at ten in the morning (UTC) of each date: facts numbered in the order they are written. */
export const story = (...told: [on: string, detail: Detail][]): BottleFact[] =>
  told.map(([on, detail], index): BottleFact => ({
    actionId: `action-${index + 1}`,
    seq: index + 1,
    happenedAt: `${on}T10:00:00.000Z`,
    happenedOn: on,
    ...detail,
  }));
