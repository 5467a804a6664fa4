import { defaultThresholds } from '@wetside/chemistry';

/** What a darkroom starts with until its manager says otherwise. */
export const HOUSE_RULES: {
  temperatureUnit: 'C' | 'F';
  volumeUnit: 'mL' | 'fl oz';
  currency: string;
  lowShareE4: number;
  lowRollsE4: number;
  nearDaysMax: number;
  nearShareE4: number;
  smallestTankUl: number | null;
} = {
  temperatureUnit: 'C',
  volumeUnit: 'mL',
  currency: 'EUR',
  ...defaultThresholds,
  smallestTankUl: null,
};

/** Small letters, digits and single dashes, 32 at the most: an id is longer, so the two cannot be mixed up. */
export function isShortName(text: string): boolean {
  return text.length <= 32 && /^[a-z0-9]+(-[a-z0-9]+)*$/.test(text);
}

/** Whether the machine knows the time zone. */
export function isZone(zone: string): boolean {
  try {
    return new Intl.DateTimeFormat('en-GB', { timeZone: zone }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
}
