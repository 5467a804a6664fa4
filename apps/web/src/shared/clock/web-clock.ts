import { localDate, type LocalDate } from '@wetside/chemistry';

/** The server's time less this device's, in milliseconds, as the last answer told it. */
let differenceMs = 0;

/** Takes the server's time from an answer's x-wetside-now. Anything unreadable is left out. */
export function learnFromAnswer(serverNow: string | null): void {
  const serverMs = serverNow === null ? Number.NaN : Date.parse(serverNow);
  if (!Number.isNaN(serverMs)) differenceMs = serverMs - Date.now();
}

/** This device's own time, raw, as an instant: what happenedAt and deviceNow are told in. */
export const deviceNow = (): string => new Date(Date.now()).toISOString();

/** This device's own time in milliseconds, for measuring a span. */
export const deviceMs = (): number => Date.now();

/** The server's time as reckoned here: what verdicts and today are made with. */
export const reckonedNow = (): string => new Date(Date.now() + differenceMs).toISOString();

/** An instant of the server's time, told in this device's time. */
export const toDeviceTime = (instant: string): string =>
  new Date(Date.parse(instant) - differenceMs).toISOString();

export const today = (zone: string): LocalDate => localDate(reckonedNow(), zone);
