import { chargeFor, type Role } from '@wetside/chemistry';
import type { FilmLine } from '../../shared/api/types.js';
import { isMeasured } from '../../shared/formats/film-words.js';
import type { Standing } from '../bottles/standing.js';

export const isOpen = ({ assessment }: Standing): boolean => !assessment.closed;

/** What a load leaves in a bottle, in 1/10,000 of a roll; null where nobody knows what it holds or takes. */
export function leftAfter({ assessment, document }: Standing, film: FilmLine) {
  const leftE4 = assessment.leftE4.film;
  if (!isMeasured(film) || typeof leftE4 !== 'number') return null;
  const { countedE4 } = chargeFor(document, [film], 'film');
  return { leftE4, countedE4, afterE4: leftE4 - countedE4 };
}

/** A bottle of unknown capacity holds every load. */
const holds = (standing: Standing, film: FilmLine): boolean => (leftAfter(standing, film)?.afterE4 ?? 0) >= 0;

const mixedFirst = ({ bottle: a }: Standing, { bottle: b }: Standing): number =>
  a.totals.mixedOn.localeCompare(b.totals.mixedOn) || a.code.localeCompare(b.code, 'en', { numeric: true });

const mostLeft = (a: Standing, b: Standing): number =>
  (b.assessment.leftE4.film ?? 0) - (a.assessment.leftE4.film ?? 0);

/** Of bottles of one role: the one mixed first that still holds the load, else the one that it goes over by least. */
function pick(bottles: readonly Standing[], film: FilmLine): Standing | undefined {
  const oldest = [...bottles].sort(mixedFirst);
  return oldest.find((one) => holds(one, film)) ?? oldest.sort(mostLeft)[0];
}

function byRole(bottles: readonly Standing[]): Map<Role, Standing[]> {
  const roles = new Map<Role, Standing[]>();
  for (const one of bottles) roles.set(one.bottle.role, [...(roles.get(one.bottle.role) ?? []), one]);
  return roles;
}

/** One bottle of each role: the person's own choice, else the one that is to be used up first. */
export function oneOfEachRole(
  bottles: readonly Standing[],
  film: FilmLine,
  chosen: ReadonlyMap<Role, string> = new Map(),
): Standing[] {
  return [...byRole(bottles)].flatMap(([role, standing]) => {
    const own = standing.find(({ bottle }) => bottle.id === chosen.get(role));
    return own ?? pick(standing, film) ?? [];
  });
}

/** Which bottle of its role takes over when this one has given out; nothing when none can. */
export function nextAfter(
  { bottle }: Standing,
  open: readonly Standing[],
  film: FilmLine,
): Standing | undefined {
  const others = open.filter((one) => one.bottle.role === bottle.role && one.bottle.id !== bottle.id);
  return others.sort(mixedFirst).find((one) => holds(one, film));
}

/** The bottle of its role that was mixed before this one, is open too, and does not hold the load. */
export function passedOver(
  { bottle }: Standing,
  open: readonly Standing[],
  film: FilmLine,
): Standing | undefined {
  const [first] = open.filter((one) => one.bottle.role === bottle.role).sort(mixedFirst);
  return first && first.bottle.id !== bottle.id && !holds(first, film) ? first : undefined;
}
