import { starterCatalogue } from './catalogue/starter-catalogue.js';
import type { ChemistryDocument } from './document.js';
import { applyDetail } from './fold-details.js';
import { openBottle } from './fold-opening.js';
import { apply, fold, isNewest } from './fold.js';
import { type BottleFact, type BottleTotals, LedgerOrderError } from './ledger.js';
import { factsOf, generateHistory, type History } from './testing/histories.js';

const seeds = Array.from({ length: 25 }, (_, index) => index + 1);
const histories = seeds.map((seed) => generateHistory(seed));

function documentOf(history: History, bottle: string): ChemistryDocument {
  const key = history.bottles.find((each) => each.id === bottle)?.documentKey;
  const entry = starterCatalogue.find((each) => each.key === key);
  if (!entry) throw new Error(`no document for ${bottle}`);
  return entry.document;
}

const bottlesOf = (step: History['steps'][number], history: History): string[] =>
  step.kind === 'act'
    ? step.facts.map((each) => each.bottle)
    : history.steps.flatMap((other) =>
        other.kind === 'act' && other.actionId === step.voids ? other.facts.map((each) => each.bottle) : [],
      );

/** Plays a history as a server would: newest facts by apply, late facts and voids by a refold. */
function play(history: History): { applied: number; late: number; voids: number } {
  const held = new Map<string, BottleTotals | null>();
  const seen = { applied: 0, late: 0, voids: 0 };
  for (const [index, step] of history.steps.entries()) {
    for (const bottle of bottlesOf(step, history)) {
      const document = documentOf(history, bottle);
      const refolded = fold(document, factsOf(history.steps.slice(0, index + 1), bottle));
      const totals = held.get(bottle) ?? null;
      const fact = step.kind === 'act' ? step.facts.find((each) => each.bottle === bottle)?.fact : undefined;
      if (fact && isNewest(totals, fact)) {
        expect(apply(document, totals, fact)).toEqual(refolded);
        seen.applied += 1;
      } else if (fact) {
        expect(() => apply(document, totals, fact)).toThrow(LedgerOrderError);
        seen.late += 1;
      } else seen.voids += 1;
      held.set(bottle, refolded);
    }
  }
  return seen;
}

/** Whether a wrong way to count is found out by any bottle of the generated histories. */
function foundOut(wrong: (document: ChemistryDocument, facts: BottleFact[]) => BottleTotals | null): number {
  return histories.filter((history) =>
    history.bottles.some(({ id }) => {
      const facts = factsOf(history.steps, id);
      const document = documentOf(history, id);
      return JSON.stringify(fold(document, facts)) !== JSON.stringify(wrong(document, facts));
    }),
  ).length;
}

describe('25 random histories', () => {
  it.each(histories)('seed $seed: apply and fold find the same', (history) => {
    const seen = play(history);
    expect(seen.applied).toBeGreaterThan(10);
  });

  it('hold every kind of step that could go wrong', () => {
    const all = histories.map(play);
    expect(all.reduce((sum, each) => sum + each.late, 0)).toBeGreaterThan(50);
    expect(all.reduce((sum, each) => sum + each.voids, 0)).toBeGreaterThan(100);
    const kinds = new Set(
      histories.flatMap((history) =>
        history.bottles.flatMap(({ id }) => factsOf(history.steps, id).map((fact) => fact.kind)),
      ),
    );
    expect([...kinds].sort()).toEqual(
      ['container-change', 'discard', 'draw', 'hold', 'load', 'mix', 'reading', 'release', 'top-up'].sort(),
    );
    const voidedMix = histories.some((history) =>
      history.bottles.some(({ id }) => fold(documentOf(history, id), factsOf(history.steps, id)) === null),
    );
    expect(voidedMix).toBe(true);
  });

  it('give the same for the same seed, and another for another', () => {
    expect(generateHistory(7)).toEqual(histories[6]);
    expect(generateHistory(7)).not.toEqual({ ...generateHistory(8), seed: 7 });
  });
});

describe('a fold that was wrong would be found out', () => {
  const byApplying = (
    change: (fact: BottleFact) => BottleFact | null,
  ): ((document: ChemistryDocument, facts: BottleFact[]) => BottleTotals | null) => {
    return (document, facts) =>
      fold(
        document,
        facts.map(change).filter((fact) => fact !== null),
      );
  };

  it('counting what was voided', () => {
    expect(foundOut(byApplying((fact) => ({ ...fact, voided: false })))).toBeGreaterThan(20);
  });

  it('taking facts in the order of recording', () => {
    const arrival = (document: ChemistryDocument, facts: BottleFact[]): BottleTotals | null =>
      facts
        .filter((fact) => !fact.voided)
        .reduce<BottleTotals | null>(
          (totals, fact) => (totals ? applyDetail(document, totals, fact) : openBottle(document, fact)),
          null,
        );
    const withoutLast = (totals: BottleTotals | null): string =>
      JSON.stringify({ ...totals, lastActionId: 0, lastHappenedAt: 0, lastSeq: 0 });
    // A late load commutes with most things, so it takes more histories to find where the order tells.
    const many = Array.from({ length: 100 }, (_, index) => generateHistory(index + 1));
    const differing = many.filter((history) =>
      history.bottles.some(({ id }) => {
        const [document, facts] = [documentOf(history, id), factsOf(history.steps, id)];
        return withoutLast(fold(document, facts)) !== withoutLast(arrival(document, facts));
      }),
    );
    expect(differing.length).toBeGreaterThan(5);
  });

  it.each(['container-change', 'draw', 'hold', 'release', 'reading', 'load'] as const)(
    'skipping each %s',
    (kind) => {
      expect(foundOut(byApplying((fact) => (fact.kind === kind ? null : fact)))).toBeGreaterThan(5);
    },
  );
});
