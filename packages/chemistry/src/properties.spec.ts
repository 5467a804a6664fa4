import fc from 'fast-check';
import { assess } from './assess.js';
import { type AssessContext, defaultThresholds } from './assess-types.js';
import { rapidFixer, starterCatalogue } from './catalogue/starter-catalogue.js';
import { chargeFor, type LoadFilm } from './charge.js';
import { addDays, addMonths, daysBetween, localDate, startOfDay } from './dates.js';
import { filmClasses, namedFormats } from './film.js';
import { lastDay } from './keeping.js';
import { fold } from './fold.js';
import { measureOut } from './mixing.js';
import { factsOf, generateHistory } from './testing/histories.js';

fc.configureGlobal({ seed: 20_260_301 });

const seeds = fc.integer({ min: 1, max: 1_000_000 });
const ctx: AssessContext = {
  now: '2026-08-01T10:00:00Z',
  today: '2026-08-01',
  zone: 'Europe/Prague',
  smallestTankUl: 300_000,
  thresholds: defaultThresholds,
};

/** Every bottle of a history with its document and facts. */
function bottlesOf(seed: number) {
  const history = generateHistory(seed, 40);
  return history.bottles.map(({ id, documentKey }) => {
    const document = starterCatalogue.find((each) => each.key === documentKey)?.document ?? rapidFixer;
    return { document, facts: factsOf(history.steps, id) };
  });
}

describe('the ledger', () => {
  it('leaves nothing negative, and a closing limit always closes', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        for (const { document, facts } of bottlesOf(seed)) {
          const totals = fold(document, facts);
          if (!totals) continue;
          const found = assess(document, totals, ctx);
          const left = found.leftE4.film ?? 0;
          expect(left).toBeGreaterThanOrEqual(0);
          expect(totals.volumeUl).toBeGreaterThanOrEqual(0);
          expect(Object.values(found.overE4).every((over) => over > 0)).toBe(true);
          expect(found.closed).toBe(
            totals.discardedAt !== null || found.limits.some((limit) => limit.closes),
          );
          expect(['open', 'low', 'near-date'].includes(found.verdict)).toBe(!found.closed);
          expect(found.sentence).not.toBe('');
        }
      }),
      { numRuns: 60 },
    );
  });

  it('does not depend on the order in which facts are read', () => {
    fc.assert(
      fc.property(seeds, fc.infiniteStream(fc.nat()), (seed, stream) => {
        for (const { document, facts } of bottlesOf(seed)) {
          const keyed = facts.map((fact) => ({ fact, key: Number(stream.next().value) }));
          const shuffled = keyed.sort((a, b) => a.key - b.key).map(({ fact }) => fact);
          expect(fold(document, shuffled)).toEqual(fold(document, facts));
        }
      }),
      { numRuns: 60 },
    );
  });

  it('a void is the history without what it names', () => {
    fc.assert(
      fc.property(seeds, fc.nat(), (seed, at) => {
        for (const { document, facts } of bottlesOf(seed)) {
          const chosen = at % facts.length;
          const voided = facts.map((fact, index) => (index === chosen ? { ...fact, voided: true } : fact));
          const without = facts.filter((_, index) => index !== chosen);
          expect(fold(document, voided)).toEqual(fold(document, without));
        }
      }),
      { numRuns: 60 },
    );
  });

  it('gives a date no sooner than the mix, and nextLookAt lies ahead and changes the answer', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        for (const { document, facts } of bottlesOf(seed)) {
          const totals = fold(document, facts);
          if (!totals) continue;
          const last = lastDay(document, totals);
          if (last !== null) expect(last >= totals.mixedOn).toBe(true);
          const now = totals.lastHappenedAt;
          const before = { ...ctx, now, today: localDate(now, ctx.zone) };
          const { nextLookAt, ...found } = assess(document, totals, before);
          if (nextLookAt === null) continue;
          expect(Date.parse(nextLookAt)).toBeGreaterThan(Date.parse(now));
          const then = { ...ctx, now: nextLookAt, today: localDate(nextLookAt, ctx.zone) };
          expect(assess(document, totals, then).conditions).not.toEqual(found.conditions);
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('a charge', () => {
  const film: fc.Arbitrary<LoadFilm> = fc.record({
    format: fc.oneof(
      fc.constantFrom(...namedFormats),
      fc.record({ widthMm: fc.integer({ min: 8, max: 600 }), heightMm: fc.integer({ min: 8, max: 900 }) }),
    ),
    count: fc.integer({ min: 1, max: 30 }),
    filmClass: fc.constantFrom(...filmClasses),
  });

  it('is rounded up once: never under the exact area, and under 1/10,000 of a roll above it', () => {
    fc.assert(
      fc.property(fc.array(film, { minLength: 1, maxLength: 6 }), (films) => {
        const { countedE4, nominalE4 } = chargeFor(rapidFixer, films, 'film');
        const one = (each: LoadFilm): number => chargeFor(rapidFixer, [each], 'film').countedE4;
        const separately = films.reduce((sum, each) => sum + one(each), 0);
        expect(Number.isInteger(countedE4)).toBe(true);
        expect(countedE4).toBeLessThanOrEqual(separately);
        expect(countedE4).toBeGreaterThan(separately - films.length);
        expect(countedE4).toBeGreaterThanOrEqual(nominalE4);
      }),
    );
  });
});

describe('measuring out', () => {
  it('adds up to the volume exactly, each part within half a microlitre', () => {
    const part = fc.record({ name: fc.constantFrom('A', 'B', 'C'), parts: fc.integer({ min: 1, max: 50 }) });
    fc.assert(
      fc.property(
        fc.array(part, { minLength: 1, maxLength: 3 }),
        fc.integer({ min: 1, max: 400 }),
        fc.integer({ min: 1, max: 200_000_000 }),
        (parts, water, volumeUl) => {
          const measured = measureOut({ kind: 'plus', parts, water }, volumeUl);
          const total = parts.reduce((sum, each) => sum + each.parts, water);
          const poured = measured.parts.reduce((sum, each) => sum + (each.volumeUl ?? 0), 0);
          expect(poured + measured.water.volumeUl).toBe(volumeUl);
          for (const [index, each] of measured.parts.entries()) {
            const exact = (volumeUl * (parts[index]?.parts ?? 0)) / total;
            expect(Math.abs((each.volumeUl ?? 0) - exact)).toBeLessThanOrEqual(0.5 + 1e-6);
          }
        },
      ),
    );
  });
});

describe('dates', () => {
  const zones = fc.constantFrom(
    'Europe/Prague',
    'America/St_Johns',
    'Pacific/Kiritimati',
    'Pacific/Pago_Pago',
    'Asia/Kathmandu',
    'Australia/Lord_Howe',
    'America/Havana',
    'Africa/Cairo',
  );
  const dates = fc.integer({ min: 0, max: 12_000 }).map((days) => addDays('2012-01-01', days));

  it('a day begins at the first instant that carries its date', () => {
    fc.assert(
      fc.property(dates, zones, (date, zone) => {
        const start = startOfDay(date, zone);
        expect(localDate(start, zone)).toBe(date);
        expect(localDate(new Date(Date.parse(start) - 1).toISOString(), zone)).toBe(addDays(date, -1));
      }),
    );
  });

  it('months keep the day or fall to the end of the month', () => {
    fc.assert(
      fc.property(dates, fc.integer({ min: 0, max: 40 }), (date, months) => {
        const later = addMonths(date, months);
        expect(addDays(date, daysBetween(date, later))).toBe(later);
        const kept = later.slice(8) === date.slice(8);
        expect(kept || addDays(later, 1).endsWith('-01')).toBe(true);
      }),
    );
  });
});
