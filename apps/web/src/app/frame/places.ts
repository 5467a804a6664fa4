import type { MemberRole } from '../../shared/api/types.js';
import { atLeast } from '../../shared/darkroom/roles.js';
import { paths } from '../../shared/routes/paths.js';

export interface Place {
  words: string;
  to: (darkroom: string) => string;
  least: MemberRole;
  group?: string;
  /** Where the phone has it: a tab, or behind More. */
  onPhone: 'tab' | 'more';
  phoneOrder: number;
}

/** Only what is built. The order is the desk's; the phone has its own. */
const places: readonly Place[] = [
  { words: 'Needs you', to: paths.needsYou, least: 'technician', onPhone: 'tab', phoneOrder: 2 },
  { words: 'Sink', to: paths.sink, least: 'member', onPhone: 'tab', phoneOrder: 1 },
  {
    words: 'Mixing',
    to: paths.newMix,
    least: 'technician',
    group: 'Mixing room',
    onPhone: 'tab',
    phoneOrder: 3,
  },
  {
    words: 'Shelf',
    to: paths.shelf,
    least: 'technician',
    group: 'Mixing room',
    onPhone: 'tab',
    phoneOrder: 4,
  },
  { words: 'Orders', to: paths.orders, least: 'technician', group: 'Office', onPhone: 'more', phoneOrder: 5 },
  { words: 'Log', to: paths.log, least: 'technician', group: 'Office', onPhone: 'more', phoneOrder: 6 },
];

export const railPlaces = (role: MemberRole): Place[] => places.filter(({ least }) => atLeast(role, least));

export const phoneTabs = (role: MemberRole): Place[] =>
  railPlaces(role)
    .filter(({ onPhone }) => onPhone === 'tab')
    .sort((a, b) => a.phoneOrder - b.phoneOrder);

/** Whether the page belongs to that place: /mixing and /mixing/new both are Mixing. */
export function isAt(pathname: string, to: string): boolean {
  const root = to.replace(/\?.*$/, '').replace(/\/new$/, '');
  return pathname === root || pathname.startsWith(`${root}/`);
}
