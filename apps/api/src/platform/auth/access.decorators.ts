import { SetMetadata } from '@nestjs/common';
import type { Role } from './roles.js';

/** Who may call a route. Each route names exactly one kind, or the server does not start. */
export type Access =
  { kind: 'public' } | { kind: 'by-secret' } | { kind: 'signed-in' } | { kind: 'role'; least: Role };

export const ACCESS = 'wetside:access';

const access = (value: Access) => SetMetadata(ACCESS, value);

/** Anybody, signed in or not. */
export const Public = () => access({ kind: 'public' });

/** Whoever holds the secret in the address; cookies are ignored and the cross-site check does not apply. */
export const BySecret = () => access({ kind: 'by-secret' });

/** Any signed-in person, on a route without a darkroom. */
export const SignedIn = () => access({ kind: 'signed-in' });

/** A member of the darkroom that the route names, with at least this role. */
export const LeastRole = (least: Role) => access({ kind: 'role', least });
