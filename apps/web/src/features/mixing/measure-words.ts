import {
  type ChemistryDocument,
  fahrenheitE2,
  type Material,
  measureOut,
  type Measured,
  MixingError,
} from '@wetside/chemistry';

/** For a measuring glass: to 0.1 mL below 100 mL, to the mL above, litres from one on. */
export function showMeasured(ul: number): string {
  if (ul < 100_000) return `${Number((ul / 1_000).toFixed(1))} mL`;
  const ml = Math.round(ul / 1_000);
  return ml < 1_000 ? `${ml} mL` : `${ml / 1_000} L`;
}

const showMass = (mg: number): string => `${Number((mg / 1_000).toFixed(1))} g`;

export const showTemperature = (cc: number, unit: 'C' | 'F'): string =>
  unit === 'F' ? `${Math.round(fahrenheitE2(cc) / 100)} °F` : `${Number((cc / 100).toFixed(1))} °C`;

function waterFirst({ water }: Measured, kind: string, at: string): string[] {
  if (water.toMake)
    return water.startUl ? [`${showMeasured(water.startUl)} of ${kind} water${at} to start with`] : [];
  return water.volumeUl > 0 ? [`${showMeasured(water.volumeUl)} of ${kind} water${at}`] : [];
}

/** What to measure out, a line each, in order: water before anything goes into it. */
export function measureLines(
  document: ChemistryDocument,
  material: Material | null,
  volumeUl: number,
  unit: 'C' | 'F',
): string[] {
  const own = document.materials.find((use) => use.material === material)?.dilution;
  const measured = measureOut(own ?? document.dilution, volumeUl);
  const { water, parts } = measured;
  const at = water.temperatureCc === undefined ? '' : ` at ${showTemperature(water.temperatureCc, unit)}`;
  const added = parts.map(({ name, volumeUl: ul, massMg, packets }) => {
    if (packets !== undefined) return `${packets} × ${name}`;
    return `${massMg === undefined ? showMeasured(ul ?? 0) : showMass(massMg)} of ${name}`;
  });
  const last = water.toMake ? [`${document.water} water to make ${showMeasured(volumeUl)}`] : [];
  return [...waterFirst(measured, document.water, at), ...added, ...last];
}

/** Why this volume cannot be mixed, or nothing. */
export function mixingProblem(
  document: ChemistryDocument,
  material: Material | null,
  volumeUl: number,
): string | null {
  try {
    measureLines(document, material, volumeUl, 'C');
    return null;
  } catch (error) {
    if (!(error instanceof MixingError)) throw error;
    return `${error.message.charAt(0).toUpperCase()}${error.message.slice(1)}.`;
  }
}
