import { ApiProperty } from '@nestjs/swagger';
import { actionKinds, type ActionKind } from '@wetside/db';
import type { Me } from '../auth/me.js';
import type { ActionWithPeople } from './actions.repository.js';
import { canBeVoided, mayVoid } from './undo-rule.js';

export class ActorView {
  @ApiProperty({ format: 'uuid' })
  membershipId: string;

  @ApiProperty()
  displayName: string;
}

export class VoidedByView {
  @ApiProperty({ format: 'uuid' })
  actionId: string;

  @ApiProperty({ format: 'date-time' })
  at: string;

  @ApiProperty()
  displayName: string;

  @ApiProperty({ type: String, nullable: true })
  reason: string | null;
}

/** One thing that somebody did, as it is now. */
export class ActionView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty({ enum: actionKinds })
  kind: ActionKind;

  @ApiProperty({ format: 'date-time' })
  happenedAt: string;

  @ApiProperty({ format: 'date' })
  happenedOn: string;

  @ApiProperty({ format: 'date-time' })
  recordedAt: string;

  @ApiProperty()
  seq: number;

  @ApiProperty({ type: ActorView })
  by: ActorView;

  @ApiProperty({ type: VoidedByView, nullable: true })
  voidedBy: VoidedByView | null;

  @ApiProperty({ description: 'Whether the caller may still take it back.' })
  canUndo: boolean;
}

export function toActionView(
  { action, displayName, voidedBy }: ActionWithPeople,
  me: Me,
  now: Date,
): ActionView {
  return {
    id: action.id,
    kind: action.kind,
    happenedAt: action.happenedAt.toISOString(),
    happenedOn: action.happenedOn,
    recordedAt: action.recordedAt.toISOString(),
    seq: action.seq,
    by: { membershipId: action.membershipId, displayName },
    voidedBy: voidedBy && { ...voidedBy, at: voidedBy.at.toISOString() },
    canUndo: !voidedBy && canBeVoided(action.kind) && mayVoid(action, me, now) === 'yes',
  };
}
