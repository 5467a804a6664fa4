import { daysBetween, type LocalDate } from '@wetside/chemistry';

/** A mix of longer ago than this is recorded as easily by a slip of the year as by intent. */
const LONG_AGO_DAYS = 30;

/** What to mind about a mix that is recorded after the fact, or nothing. */
export function lateWords(lastDay: LocalDate | null, mixedOn: LocalDate, today: LocalDate): string | null {
  if (lastDay !== null && lastDay < today) return 'It would be past its date already.';
  const days = daysBetween(mixedOn, today);
  return days > LONG_AGO_DAYS ? `That is ${days} days ago. Is the day right?` : null;
}
