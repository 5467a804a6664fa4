import type { EventKind, eventEndings } from '@wetside/db';

/**
 * Why a condition changed: something was done; something was taken back (a void, a cancelled order, a changed rule);
 * or time went by.
 */
export type Cause = (typeof eventEndings)[number];

/** The newest event of one kind about one subject. */
export interface LatestEvent {
  id: string;
  kind: EventKind;
  subjectId: string;
  crossing: number;
  endedBy: Cause | null;
}

export type CrossingStep = 'nothing' | 'open-new' | 'reopen' | 'end';

/**
 * What becomes of an event, by whether its condition holds now. What was only taken back is the same crossing again:
 * its row opens anew and says nothing twice. Everything else that ended stays ended, and the next crossing is a new one.
 */
export function crossingStep(
  latest: Pick<LatestEvent, 'endedBy'> | null,
  holds: boolean,
  cause: Cause,
): CrossingStep {
  if (!latest) return holds ? 'open-new' : 'nothing';
  const open = latest.endedBy === null;
  if (open === holds) return 'nothing';
  if (open) return 'end';
  return latest.endedBy === 'retraction' || cause === 'retraction' ? 'reopen' : 'open-new';
}
