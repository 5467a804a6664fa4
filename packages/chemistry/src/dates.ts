/** A date of the darkroom's own zone, 'YYYY-MM-DD'. */
export type LocalDate = string;

const DAY_MS = 86_400_000;
const pattern = /^(\d{4})-(\d{2})-(\d{2})$/;
const formats = new Map<string, Intl.DateTimeFormat>();
/** The same few days are asked for at each look at a bottle. */
const starts = new Map<string, string>();
const STARTS_KEPT = 2_000;

/** Making a format costs far more than using it, and a darkroom has one zone. */
function formatFor(zone: string): Intl.DateTimeFormat {
  const known = formats.get(zone);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    calendar: 'gregory',
    numberingSystem: 'latn',
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  });
  formats.set(zone, made);
  return made;
}

/** The wall clock at that instant, written as if it were UTC, in milliseconds. */
function wallClock(instantMs: number, zone: string): number {
  const parts = new Map(
    formatFor(zone)
      .formatToParts(instantMs)
      .map((part) => [part.type, Number(part.value)]),
  );
  const of = (type: Intl.DateTimeFormatPartTypes): number => parts.get(type) ?? 0;
  return Date.UTC(of('year'), of('month') - 1, of('day'), of('hour'), of('minute'), of('second'));
}

const isoDate = (ms: number): LocalDate => new Date(ms).toISOString().slice(0, 10);

/** The instant in milliseconds. Throws RangeError when the text is no instant. */
export function instantMs(iso: string): number {
  const ms = Date.parse(iso);
  if (Number.isNaN(ms)) throw new RangeError(`not an instant: ${iso}`);
  return ms;
}

/** Whole days from 1970-01-01. Throws RangeError when the text is not a date of the calendar. */
function dayNumber(date: LocalDate): number {
  if (!isLocalDate(date)) throw new RangeError(`not a date: ${date}`);
  return Date.parse(`${date}T00:00:00Z`) / DAY_MS;
}

/** Whether the text is a date of the calendar. */
export function isLocalDate(text: string): boolean {
  if (!pattern.test(text)) return false;
  // A day that its month does not have is read as one of the next month.
  return new Date(`${text}T00:00:00Z`).getUTCDate() === Number(text.slice(8));
}

/** The date on the wall at that instant. Throws RangeError for a bad instant or zone. */
export function localDate(instantIso: string, zone: string): LocalDate {
  return isoDate(wallClock(instantMs(instantIso), zone));
}

/**
 * The instant at which that local day begins, as ISO text. Where a clock change skips midnight the day
 * begins with its first minute; where a zone skips the whole date, with the first instant after it.
 */
export function startOfDay(date: LocalDate, zone: string): string {
  const key = `${date} ${zone}`;
  const known = starts.get(key);
  if (known !== undefined) return known;
  const start = findStartOfDay(date, zone);
  if (starts.size >= STARTS_KEPT) starts.clear();
  starts.set(key, start);
  return start;
}

function findStartOfDay(date: LocalDate, zone: string): string {
  const utcMidnight = dayNumber(date) * DAY_MS;
  const offsetAt = (ms: number): number => wallClock(ms, zone) - ms;
  const before = offsetAt(utcMidnight - DAY_MS);
  if (before === offsetAt(utcMidnight + DAY_MS)) return new Date(utcMidnight - before).toISOString();
  let [low, high] = [utcMidnight - DAY_MS, utcMidnight + DAY_MS];
  while (high - low > 1_000) {
    const middle = Math.floor((low + high) / 2_000) * 1_000;
    if (wallClock(middle, zone) >= utcMidnight) high = middle;
    else low = middle;
  }
  return new Date(high).toISOString();
}

export function addDays(date: LocalDate, days: number): LocalDate {
  return isoDate((dayNumber(date) + days) * DAY_MS);
}

/** The same day of the month, n months on, or that month's last day when it is shorter. */
export function addMonths(date: LocalDate, months: number): LocalDate {
  dayNumber(date);
  const [year, month, day] = date.split('-').map(Number) as [number, number, number];
  const lastOfTarget = new Date(Date.UTC(year, month + months, 0));
  const clamped = Math.min(day, lastOfTarget.getUTCDate());
  return isoDate(Date.UTC(lastOfTarget.getUTCFullYear(), lastOfTarget.getUTCMonth(), clamped));
}

/** Whole days from the first date to the second; negative when the second is earlier. */
export function daysBetween(from: LocalDate, to: LocalDate): number {
  return dayNumber(to) - dayNumber(from);
}

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** '1 Feb', or '1 Feb 2028' when it is so far from today that the bare day could mislead. */
export function showDate(date: LocalDate, today: LocalDate): string {
  const [year, month, day] = date.split('-').map(Number) as [number, number, number];
  const bare = `${day} ${months[month - 1] ?? ''}`;
  return Math.abs(daysBetween(today, date)) > 330 ? `${bare} ${year}` : bare;
}
