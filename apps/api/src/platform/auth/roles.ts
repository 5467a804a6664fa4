import { roles, type MemberRole } from '@wetside/db';

export type Role = MemberRole;
/** From the least to the most. */
export const ROLES: readonly Role[] = roles;

/** Whether the role may do what takes at least `least`. */
export function reaches(role: Role, least: Role): boolean {
  return ROLES.indexOf(role) >= ROLES.indexOf(least);
}
