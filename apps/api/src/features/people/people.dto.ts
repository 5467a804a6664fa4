import { ROLES, type Role } from '../../platform/auth/roles.js';
import { Choice, Id, Instant, Text } from '../../platform/dto/fields.js';

/** Somebody of the darkroom; addresses are not shown. */
export class MembershipView {
  @Id()
  membershipId: string;

  @Text({ max: 80 })
  displayName: string;

  @Choice(ROLES)
  role: Role;

  @Instant()
  joinedAt: string;
}
