import type { EventKind } from '@wetside/db';
import { alertWords, loadFilmWords, type Day } from './alert-words.js';
import type { Subject } from './conditions.js';
import type { Told } from './mail-plan.js';
import type { NeedsYouRowView, Verb } from './needs-you.dto.js';
import { byGravity, closes, gravest } from './severity.js';

/** An event that is open. */
export interface OpenRow {
  id: string;
  kind: EventKind;
  subjectId: string;
  crossing: number;
  openedAt: Date;
}

const verbs: Partial<Record<EventKind, Verb>> = {
  'past-date': 'discard',
  spent: 'discard',
  'on-hold': 'release',
  low: 'mix',
  'near-date': 'mix',
  'reorder-point': 'order',
  'load-to-decide': 'decide',
};

function verbOf(kind: EventKind, open: readonly OpenRow[]): Verb {
  // What is on its way already is not ordered again.
  if (kind === 'none-on-shelf') return open.some((one) => one.kind === 'reorder-point') ? 'order' : 'look';
  return verbs[kind] ?? 'look';
}

/** 'Mailed to 3. 1 mail may have arrived twice. 1 mail could not be delivered'. */
export function mailWords(told: readonly Told[]): { mailedTo: number; text: string } {
  const people = (holds: (one: Told) => boolean) =>
    new Set(told.filter(holds).map(({ membershipId }) => membershipId)).size;
  const unclear = ({ unclearTries }: Told) => unclearTries > 0;
  const mailedTo = people(({ mailState }) => mailState === 'sent');
  const clauses: [number, string][] = [
    [people((one) => one.mailState === 'sent' && unclear(one)), 'may have arrived twice'],
    [people((one) => onItsWay(one) && unclear(one)), 'may have arrived and will be sent once more'],
    [people((one) => one.mailState === 'failed' && unclear(one)), 'may have arrived, no answer said so'],
    [people((one) => one.mailState === 'failed' && !unclear(one)), 'could not be delivered'],
  ];
  const text = [
    ...(mailedTo > 0 ? [`Mailed to ${mailedTo}`] : []),
    ...clauses.flatMap(([count, words]) =>
      count > 0 ? [`${count} ${count === 1 ? 'mail' : 'mails'} ${words}`] : [],
    ),
  ].join('. ');
  return { mailedTo, text };
}

const onItsWay = ({ mailState }: Told): boolean => mailState === 'waiting' || mailState === 'leased';

function about(subject: Subject): Pick<NeedsYouRowView, 'bottle' | 'pack' | 'load'> {
  if (subject.of === 'bottle') {
    const { id, code, document } = subject.facts;
    return { bottle: { id, code, name: document.name } };
  }
  if (subject.of === 'pack') return { pack: { id: subject.id, name: subject.facts.name } };
  const { id, by } = subject.facts;
  return { load: { actionId: id, by, sentence: loadFilmWords(subject.facts) } };
}

function rowOf(
  subject: Subject,
  open: readonly OpenRow[],
  told: readonly Told[],
  day: Day,
): NeedsYouRowView | null {
  const [first, second] = byGravity(open);
  if (!first) return null;
  const said = gravest(open);
  const { sentence, why } = alertWords(
    subject,
    said.map(({ kind }) => kind),
    day,
  );
  const mail = mailWords(told.filter(({ eventId }) => said.some(({ id }) => id === eventId)));
  return {
    eventId: first.id,
    kind: first.kind,
    ...(second ? { also: second.kind } : {}),
    openedAt: first.openedAt.toISOString(),
    crossing: first.crossing,
    sentence,
    why: mail.text ? `${why}. ${mail.text}` : why,
    mailedTo: mail.mailedTo,
    ...about(subject),
    verb: verbOf(first.kind, open),
  };
}

/** What needs somebody: the gravest about each subject; bottles that nobody should load first, then the oldest. */
export function needsYouRows(
  subjects: readonly Subject[],
  open: readonly OpenRow[],
  told: readonly Told[],
  day: Day,
): NeedsYouRowView[] {
  const rows = subjects.flatMap((subject) => {
    const row = rowOf(
      subject,
      open.filter(({ subjectId }) => subjectId === subject.id),
      told,
      day,
    );
    return row ? [row] : [];
  });
  return rows.sort(
    (a, b) =>
      Number(closes(b.kind)) - Number(closes(a.kind)) ||
      a.openedAt.localeCompare(b.openedAt) ||
      a.eventId.localeCompare(b.eventId),
  );
}
