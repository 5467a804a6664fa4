import {
  localDate,
  roundLeftDown,
  roundUsedUp,
  showDate,
  type Limit,
  type LocalDate,
  type Material,
  type StepFlag,
} from '@wetside/chemistry';
import type { EventKind } from '@wetside/db';
import { filmWords } from '../log/log-words.js';
import type { BottleFacts, LoadFacts, PackFacts } from './alert-facts.js';
import { flagsToDecide, type Subject } from './conditions.js';

/** What a warning says: the whole of it in a sentence without its full stop, the figures behind it, what to do. */
export interface AlertWords {
  sentence: string;
  why: string;
  advice: string;
}

/** The darkroom's present date, and where it is so. */
export interface Day {
  today: LocalDate;
  zone: string;
}

type BottleSubject = Extract<Subject, { of: 'bottle' }>;

const small = (text: string): string => `${text.charAt(0).toLowerCase()}${text.slice(1)}`;

/** 'FX-31 fixer', 'SB-02 stop bath'. */
export function bottleName({ code, document: { role } }: BottleFacts): string {
  const dashed = role === 'bleach-fix' || role === 'pre-bleach';
  return `${code} ${dashed ? role : role.replaceAll('-', ' ')}`;
}

/** The words of the gravest kinds (more than one where they are said together), about how the subject stands now. */
export function alertWords(subject: Subject, kinds: readonly EventKind[], day: Day): AlertWords {
  if (subject.of === 'pack') return packWords(subject.facts, kinds.includes('none-on-shelf'));
  if (subject.of === 'load') return loadWords(subject.facts, day.today);
  return bottleWords(subject, kinds, day);
}

function bottleWords(subject: BottleSubject, kinds: readonly EventKind[], day: Day): AlertWords {
  const { today } = day;
  const name = bottleName(subject.facts);
  const of = (kind: EventKind) => kinds.includes(kind);
  const clause = { past: pastClause(subject, today), spent: spentClause(subject) };
  if (of('past-date')) {
    return {
      sentence: `${name} is ${clause.past}${of('spent') ? `, and spent: ${clause.spent}` : ''}`,
      why: `${mixed(subject, today)}. ${used(subject)}`,
      advice: 'Discard it, and mix the next one.',
    };
  }
  if (of('spent')) {
    return {
      sentence: `${name} is spent: ${clause.spent}`,
      why: `${used(subject)}. ${keeps(subject, today)}`,
      advice: 'Discard it, and mix the next one.',
    };
  }
  if (of('on-hold')) return holdWords(subject, name, day);
  if (of('low')) {
    return {
      sentence: `${name} is running low: ${leftClause(subject)}`,
      why: `${used(subject)}. ${keeps(subject, today)}`,
      advice: 'Have the next one mixed before it is spent.',
    };
  }
  return {
    sentence: `${name} is near its date: it ${small(keeps(subject, today))}`,
    why: `${mixed(subject, today)}. ${used(subject)}`,
    advice: 'Use it up, or have the next one mixed by then.',
  };
}

function holdWords(
  { facts: { holdBy, totals } }: BottleSubject,
  name: string,
  { today, zone }: Day,
): AlertWords {
  const hold = totals?.hold;
  const since = hold ? showDate(localDate(hold.since, zone), today) : '';
  return {
    sentence: `${name} is on hold${holdBy ? ` by ${holdBy}` : ''}${hold ? `: ${hold.reason}` : ''}`,
    why: `On hold${since ? ` since ${since}` : ''}: nobody should load it`,
    advice: 'Test it, then release it or discard it.',
  };
}

const limit = (subject: BottleSubject, holds: (one: Limit) => boolean): Limit | undefined =>
  subject.assessment?.limits.find(holds);

function pastClause(subject: BottleSubject, today: LocalDate): string {
  const last = subject.assessment?.lastDay;
  return last ? `past its date since ${showDate(last, today)}` : 'past its date';
}

/** '26 of 24 rolls used, 2 over', 'empty', 'the last test leaves nothing'. */
function spentClause(subject: BottleSubject): string {
  const closing = limit(subject, ({ kind, closes }) => closes && (kind === 'capacity' || kind === 'test'));
  const text = closing ?? limit(subject, ({ kind, closes }) => closes && kind === 'volume');
  return text ? small(text.text.replace(/^Spent: /, '')) : 'nothing is left';
}

const measure = (material: Material, figure: string): string =>
  `${figure} ${material === 'film' ? 'roll' : 'print'}${figure === '1' ? '' : 's'}`;

function leftClause(subject: BottleSubject): string {
  const { assessment } = subject;
  const material = assessment?.material;
  const left = material ? assessment.leftE4[material] : null;
  return material && left != null
    ? `${measure(material, roundLeftDown(left))} left`
    : small(assessment?.sentence ?? '');
}

/** '20 rolls rated, 16 used'. */
function used({ assessment, facts: { totals, document } }: BottleSubject): string {
  const material = assessment?.material;
  if (!material || !totals) return 'Not used yet';
  const rated = assessment.ratedE4[material];
  const usedText = roundUsedUp(totals.usedE4[material] ?? 0);
  if (rated == null || document.use !== 're-used') return `${measure(material, usedText)} so far`;
  return `${measure(material, roundLeftDown(rated))} rated, ${usedText} used`;
}

function keeps({ assessment }: BottleSubject, today: LocalDate): string {
  const last = assessment?.lastDay;
  return last ? `Keeps to ${showDate(last, today)}` : 'Keeping time not known';
}

function mixed({ facts: { totals } }: BottleSubject, today: LocalDate): string {
  if (!totals) return 'Not mixed';
  return `Mixed ${totals.about ? 'about ' : ''}${showDate(totals.mixedOn, today)}`;
}

function packWords({ name, unopened, onOrder, reorderPoint }: PackFacts, none: boolean): AlertWords {
  const due = reorderPoint !== null && unopened + onOrder <= reorderPoint;
  const why = `${unopened} unopened, ${onOrder} on order, reorder at ${reorderPoint ?? 0}`;
  return {
    sentence: none
      ? `${name}: none on the shelf`
      : `${name}: ${unopened} on the shelf, reorder at ${reorderPoint ?? 0}`,
    why,
    advice: due ? 'Order it.' : 'It is on order: nothing to do until it comes.',
  };
}

const flagWords: Partial<Record<StepFlag, string>> = {
  past_date: 'after its date',
  on_hold: 'while it was on hold',
  after_discard: 'after it was discarded',
  incompatible: 'with film that it does not take',
  wrong_material: 'with a material that it is not for',
};

/** '2 rolls of 135, 4 sheets of 4×5'. */
export const loadFilmWords = ({ film }: LoadFacts): string => film.map(filmWords).join(', ') || 'A load';

function loadWords(facts: LoadFacts, today: LocalDate): AlertWords {
  const steps = facts.steps.flatMap(({ code, flags }) => {
    const words = flagsToDecide(flags).map((flag) => flagWords[flag] ?? flag);
    return words.length > 0 ? [`${code} ${words.join(' and ')}`] : [];
  });
  return {
    sentence: `A load went through ${steps.join(', ')}`,
    why: `${loadFilmWords(facts)}, by ${facts.by} on ${showDate(facts.happenedOn, today)}`,
    advice: 'Accept it with a reason, or void it.',
  };
}
