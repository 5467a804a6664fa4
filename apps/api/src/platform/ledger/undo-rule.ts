import type { ActionKind } from '@wetside/db';
import { reaches, type Role } from '../auth/roles.js';

export const UNDO_HOURS = 12;
const UNDO_MS = UNDO_HOURS * 3_600_000;

/** What has left the house cannot be taken back: an order that went out is cancelled, a void is answered by doing it anew. */
const NEVER: readonly ActionKind[] = ['void', 'order-send', 'order-cancel'];

export const canBeVoided = (kind: ActionKind): boolean => !NEVER.includes(kind);

export type MayVoid = 'yes' | 'too-late' | 'not-yours';

/** Undo is voiding one's own action within 12 hours of its recording; after that, or another's, takes a technician. */
export function mayVoid(
  action: { membershipId: string; recordedAt: Date },
  me: { membershipId: string; role: Role },
  now: Date,
): MayVoid {
  if (reaches(me.role, 'technician')) return 'yes';
  if (action.membershipId !== me.membershipId) return 'not-yours';
  return now.getTime() - action.recordedAt.getTime() <= UNDO_MS ? 'yes' : 'too-late';
}
