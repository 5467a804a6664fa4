import type { Role } from '@wetside/chemistry';
import type { Standing } from './standing.js';

/** The order in which film meets the baths. */
const order: readonly Role[] = [
  'pre-bleach',
  'first-developer',
  'developer',
  'colour-developer',
  'monobath',
  'stop-bath',
  'reversal-bath',
  'bleach',
  'bleach-fix',
  'fixer',
  'washing-aid',
  'toner',
  'stabiliser',
  'final-rinse',
  'wetting-agent',
  'replenisher',
  'starter',
  'tray',
  'found',
];

export const inLineOrder = (standings: readonly Standing[]): Standing[] =>
  [...standings].sort(
    (a, b) =>
      order.indexOf(a.bottle.role) - order.indexOf(b.bottle.role) ||
      a.bottle.code.localeCompare(b.bottle.code),
  );

/** Without these a film is lost: a load never leaves one out without a word. */
const essentialRoles: readonly Role[] = [
  'developer',
  'first-developer',
  'colour-developer',
  'monobath',
  'bleach',
  'bleach-fix',
  'fixer',
];

export const isEssential = (role: Role): boolean => essentialRoles.includes(role);

const aside: readonly Role[] = ['replenisher', 'starter', 'found', 'tray'];

/** Whether film is put through this bottle. */
export function takesFilm({ bottle, document }: Standing): boolean {
  if (aside.includes(bottle.role)) return false;
  if (bottle.material) return bottle.material === 'film';
  return document.materials.length === 0 || document.materials.some((use) => use.material === 'film');
}
