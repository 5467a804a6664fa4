import { addDays, localDate, showDate, type LocalDate } from '@wetside/chemistry';

const clocks = new Map<string, Intl.DateTimeFormat>();

function clockOf(zone: string): Intl.DateTimeFormat {
  const known = clocks.get(zone);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  clocks.set(zone, made);
  return made;
}

/** '10:42' on the darkroom's wall. */
export const showTime = (instant: string, zone: string): string => clockOf(zone).format(Date.parse(instant));

/** 'today 10:42', 'yesterday 10:42', '27 Nov 10:42'. */
export function showInstant(instant: string, zone: string, today: LocalDate): string {
  const date = localDate(instant, zone);
  const day = date === today ? 'today' : date === addDays(today, -1) ? 'yesterday' : showDate(date, today);
  return `${day} ${showTime(instant, zone)}`;
}

const wallPattern = /^\d{4}-\d\d-\d\dT\d\d:\d\d$/;

/** 'YYYY-MM-DDTHH:mm' as a datetime field wants it, on the darkroom's wall. */
export const toWallClock = (instant: string, zone: string): string =>
  `${localDate(instant, zone)}T${showTime(instant, zone)}`;

/**
 * The instant at which the darkroom's wall reads that. In an hour that a clock change repeats, the earlier
 * instant; in one that it skips, the instant as far on. Null when the text is no date and time.
 */
export function fromWallClock(wall: string, zone: string): string | null {
  const asUtc = wallPattern.test(wall) ? Date.parse(`${wall}:00Z`) : Number.NaN;
  if (Number.isNaN(asUtc)) return null;
  const offsetAt = (ms: number): number => {
    const there = toWallClock(new Date(ms).toISOString(), zone);
    return Date.parse(`${there}:00Z`) - Math.floor(ms / 60_000) * 60_000;
  };
  const guess = asUtc - offsetAt(asUtc);
  return new Date(asUtc - offsetAt(guess)).toISOString();
}
