import type { EventKind } from '@wetside/db';
import type { House } from '../../platform/house/house.repository.js';
import { alertWords, type Day } from './alert-words.js';
import type { Subject } from './conditions.js';

const SUBJECT_LENGTH = 140;

/** Where a warning leads. */
function pageOf(subject: Subject): string {
  if (subject.of === 'bottle') return `bottles/${encodeURIComponent(subject.facts.code)}`;
  return subject.of === 'pack' ? 'shelf' : 'needs-you';
}

/** A warning as a mail: what, which, why, what to do and where. */
export function warningMail(
  subject: Subject,
  kinds: readonly EventKind[],
  { house, origin, day }: { house: House; origin: string; day: Day },
): { subject: string; body: string } {
  const { sentence, why, advice } = alertWords(subject, kinds, day);
  const home = `${origin}/d/${house.shortName}`;
  const line = sentence.replaceAll(/\s+/g, ' ');
  return {
    subject: line.length > SUBJECT_LENGTH ? `${line.slice(0, SUBJECT_LENGTH - 1)}…` : line,
    body: [
      `${line}.`,
      '',
      `Why: ${why}.`,
      `What to do: ${advice}`,
      '',
      `${home}/${pageOf(subject)}`,
      '',
      '--',
      `${house.darkroomName} keeps its chemistry in Wetside. Technicians and managers get each warning once;`,
      `what is still open stands here: ${home}/needs-you`,
      '',
    ].join('\n'),
  };
}
