import type { Role } from '@wetside/chemistry';
import type { Standing } from '../bottles/standing.js';

/** What the person has said about the baths of a load. */
export interface BathPicks {
  /** Which bottle of a role, where that was tapped; of the other roles the program takes the first in turn. */
  chosen: ReadonlyMap<Role, string>;
  leftOut: ReadonlySet<string>;
  /** Closed bottles that the film has been through already. */
  reported: ReadonlySet<string>;
}

export const noPicks = (reported: Iterable<string> = []): BathPicks => ({
  chosen: new Map(),
  leftOut: new Set(),
  reported: new Set(reported),
});

const withId = (set: ReadonlySet<string>, id: string): Set<string> => new Set([...set, id]);
const without = (set: ReadonlySet<string>, id: string): Set<string> =>
  new Set([...set].filter((one) => one !== id));

const taken = (picks: BathPicks, { bottle }: Standing): BathPicks => ({
  ...picks,
  chosen: new Map(picks.chosen).set(bottle.role, bottle.id),
  leftOut: without(picks.leftOut, bottle.id),
});

function returned(picks: BathPicks, { bottle }: Standing): BathPicks {
  const chosen = new Map(picks.chosen);
  chosen.delete(bottle.role);
  return { ...picks, chosen, reported: without(picks.reported, bottle.id) };
}

/** A tap on a tape: out, or in, and then any other bottle of its role goes out. */
export function toggled(picks: BathPicks, bath: Standing, isIn: boolean): BathPicks {
  const { id, role } = bath.bottle;
  const { leftOut, reported } = picks;
  // A reported bottle goes back to closed, and a closed one is only left out knowingly or not.
  if (reported.has(id) && isIn) return returned(picks, bath);
  if (bath.assessment.closed && !reported.has(id)) {
    return { ...picks, leftOut: leftOut.has(id) ? without(leftOut, id) : withId(leftOut, id) };
  }
  if (!isIn) return taken(picks, bath);
  return { ...picks, chosen: new Map(picks.chosen).set(role, id), leftOut: withId(leftOut, id) };
}

/** The film has been through this closed bottle already. */
export const reportedAs = (picks: BathPicks, bath: Standing): BathPicks => ({
  ...taken(picks, bath),
  reported: withId(picks.reported, bath.bottle.id),
});
