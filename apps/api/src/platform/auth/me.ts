import type { Role } from './roles.js';

/** The caller as a member of the darkroom they are in, with what of the darkroom every feature needs. */
export interface Me {
  membershipId: string;
  personId: string;
  role: Role;
  displayName: string;
  darkroomId: string;
  darkroomName: string;
  shortName: string;
  /** IANA time zone of the darkroom; its local dates follow it. */
  zone: string;
}
