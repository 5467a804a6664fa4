import { v7 } from 'uuid';
import type { Subject } from './conditions.js';
import { crossingStep, type Cause, type LatestEvent } from './crossing.js';
import type { NewEvent } from './events.repository.js';
import type { OpenEvent } from './mail-plan.js';

/** What becomes of the events about one subject. */
export interface Crossings {
  subject: Subject;
  opened: NewEvent[];
  reopened: string[];
  ended: string[];
  /** Open once all of that is done. */
  open: OpenEvent[];
}

const columnOf = { bottle: 'bottleId', pack: 'packId', load: 'loadActionId' } as const;

/** Compares what holds with what is open. */
export function crossingsOf(
  subject: Subject,
  events: readonly LatestEvent[],
  { darkroomId, now, cause }: { darkroomId: string; now: Date; cause: Cause },
): Crossings {
  const found: Crossings = { subject, opened: [], reopened: [], ended: [], open: [] };
  for (const kind of subject.judged) {
    const latest = events.find((event) => event.subjectId === subject.id && event.kind === kind) ?? null;
    const holds = subject.holds.includes(kind);
    const step = crossingStep(latest, holds, cause);
    if (step === 'open-new') {
      const crossing = (latest?.crossing ?? 0) + 1;
      const event = {
        darkroomId,
        id: v7(),
        kind,
        crossing,
        openedAt: now,
        [columnOf[subject.of]]: subject.id,
      };
      found.opened.push(event);
      found.open.push({ id: event.id, kind });
    } else if (latest) {
      if (step === 'reopen') found.reopened.push(latest.id);
      if (step === 'end') found.ended.push(latest.id);
      if (holds) found.open.push({ id: latest.id, kind });
    }
  }
  return found;
}

export const isChange = ({ opened, reopened, ended }: Crossings): boolean =>
  opened.length + reopened.length + ended.length > 0;
