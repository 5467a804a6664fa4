import type { ActionKind } from '@wetside/db';

const MINUTE = 60_000;
/** A device's clock may be this far off before its times are corrected. */
const CLOCK_SLACK_MS = 2 * MINUTE;
const AHEAD_MS = 5 * MINUTE;
const LATE_MS = 60 * MINUTE;
export const BEFORE_MIX_MS = 24 * 60 * MINUTE;
const BACK_DATE_MS = 30 * 24 * 60 * MINUTE;

export interface Told {
  kind: ActionKind;
  happenedAt: Date;
  deviceNow: Date;
}

export interface Happened {
  at: Date;
  /** It was told for the future and stands at the present instead. */
  clamped: boolean;
  late: boolean;
  /** Over 30 days ago: takes a technician. */
  longAgo: boolean;
}

/**
 * The time at which something happened, as far as the server can know it: what the device told, moved by the difference
 * of the two clocks where that is over 2 minutes. A load told for more than 5 minutes ahead stands at now.
 * @returns null for anything else told that far ahead
 */
export function happened(told: Told, now: Date): Happened | null {
  const skew = now.getTime() - told.deviceNow.getTime();
  let at = told.happenedAt.getTime() + (Math.abs(skew) > CLOCK_SLACK_MS ? skew : 0);
  const ahead = at - now.getTime() > AHEAD_MS;
  if (ahead && told.kind !== 'load') return null;
  if (ahead) at = now.getTime();
  const age = now.getTime() - at;
  return { at: new Date(at), clamped: ahead, late: age > LATE_MS, longAgo: age > BACK_DATE_MS };
}
