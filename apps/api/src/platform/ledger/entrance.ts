import type { CallerInfo } from '../auth/caller.js';
import type { DarkroomAccess } from '../auth/darkroom-access.js';
import type { Me } from '../auth/me.js';
import type { Tx } from '../database/database.js';

/** A way into a darkroom for one person: opens the transaction, reads the membership, runs the work in it. */
export type Entrance = <T>(work: (tx: Tx, me: Me) => Promise<T>) => Promise<T>;

export const entranceOf =
  (access: DarkroomAccess, caller: CallerInfo, darkroom: string): Entrance =>
  (work) =>
    access.enter(caller, darkroom, work);
