export const roles = [
  'developer',
  'first-developer',
  'colour-developer',
  'stop-bath',
  'fixer',
  'monobath',
  'bleach',
  'bleach-fix',
  'reversal-bath',
  'pre-bleach',
  'washing-aid',
  'wetting-agent',
  'final-rinse',
  'stabiliser',
  'toner',
  'replenisher',
  'starter',
  'tray',
  'found',
] as const;
export type Role = (typeof roles)[number];

/** The two letters a bottle's code begins with, by its role. */
export const roleLetters: Record<Role, string> = {
  developer: 'DV',
  'first-developer': 'DV',
  'colour-developer': 'CD',
  'stop-bath': 'SB',
  fixer: 'FX',
  monobath: 'MB',
  bleach: 'BL',
  'bleach-fix': 'BX',
  'reversal-bath': 'RV',
  'pre-bleach': 'PB',
  'washing-aid': 'WA',
  'wetting-agent': 'WT',
  'final-rinse': 'FR',
  stabiliser: 'ST',
  toner: 'TN',
  replenisher: 'RP',
  starter: 'SR',
  tray: 'TR',
  found: 'NN',
};

export const processes = ['black-and-white', 'C-41', 'E-6', 'RA-4', 'ECN-2'] as const;
export type Process = (typeof processes)[number];

export const waysOfUse = ['re-used', 'one-shot', 'replenished'] as const;
export type WayOfUse = (typeof waysOfUse)[number];

/** How a used-up solution is kept apart until it is collected. */
export const wasteRoutes = [
  'fixer-silver',
  'bleach-fix-silver-iron',
  'developer',
  'stop-and-acids',
  'carrier-only',
  'other',
  'unknown',
] as const;
export type WasteRoute = (typeof wasteRoutes)[number];
