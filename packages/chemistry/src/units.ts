import { fraction, floor } from './fraction.js';

/** One roll (or one 8×10 print) in ten-thousandths. */
export const E4 = 10_000;
export const UL_PER_ML = 1_000;
export const UL_PER_L = 1_000_000;
export const MG_PER_G = 1_000;

/** 80 square inches of film, the unit of capacity: 516.128 cm², by 1 in = 2.54 cm. */
export const ROLL_CM2 = 516.128;
/** The same area in hundredths of a square millimetre, which is whole. */
export const ROLL_MM2_E2 = 5_161_280;

/** 29.5735295625 mL: the US fluid ounce by definition, here in whole 1/10,000,000 of a microlitre. */
const FL_OZ_UL_E7 = 295_735_295_625n;

export const millilitres = (ml: number): number => Math.round(ml * UL_PER_ML);
export const litres = (l: number): number => Math.round(l * UL_PER_L);
export const toMillilitres = (ul: number): number => ul / UL_PER_ML;
export const toLitres = (ul: number): number => ul / UL_PER_L;

/** US fluid ounces to whole microlitres, nearest. */
export const fluidOunces = (flOz: number): number => Math.round((flOz * Number(FL_OZ_UL_E7)) / 10_000_000);

/** Microlitres to US fluid ounces. */
export const toFluidOunces = (ul: number): number => (ul * 10_000_000) / Number(FL_OZ_UL_E7);

/** An area in cm² as rolls, exact only as far as a double is; charges use whole numbers instead. */
export const rollsOfArea = (cm2: number): number => cm2 / ROLL_CM2;

/** Hundredths of a degree Celsius from hundredths of a degree Fahrenheit, nearest. */
export const celsiusCc = (fahrenheitE2: number): number => Math.round(((fahrenheitE2 - 3_200) * 5) / 9);

/** Hundredths of a degree Fahrenheit from hundredths of a degree Celsius, nearest. */
export const fahrenheitE2 = (cc: number): number => Math.round((cc * 9) / 5 + 3_200);

const tenths = (wholeTenths: number): string => {
  const text = (wholeTenths / 10).toFixed(1);
  return text.endsWith('.0') ? text.slice(0, -2) : text;
};

/** What is left, for a screen: whole tenths of a roll, rounded down, '13.4' or '14'. */
export const roundLeftDown = (rollsE4: number): string =>
  tenths(floor(fraction(Math.max(0, rollsE4), E4 / 10)));

/** What is used or over, for a screen: whole tenths of a roll, rounded up. */
export const roundUsedUp = (rollsE4: number): string => tenths(Math.ceil(Math.max(0, rollsE4) / (E4 / 10)));

/** A time for a screen, rounded up to the next five seconds: '4:35'. */
export function roundTimeUp(seconds: number): string {
  const whole = Math.ceil(seconds / 5) * 5;
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/** A volume on hand for a screen: '600 mL' below one litre, '1.5 L' from there, rounded down to whole mL. */
export function showVolume(ul: number): string {
  const ml = Math.floor(ul / UL_PER_ML);
  return ml < 1_000 ? `${ml} mL` : `${ml / 1_000} L`;
}

/** A volume that is needed, the same way but rounded up. */
export const showNeededVolume = (ul: number): string => showVolume(Math.ceil(ul / UL_PER_ML) * UL_PER_ML);
