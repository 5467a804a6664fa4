const SHAPE = /^(-)?P(?:(\d+)W)?(?:(\d+)D)?(?:T(?:(\d+)H)?(?:(\d+)M)?(?:(\d+)S)?)?$/;
const SECONDS = [7 * 86_400, 86_400, 3_600, 60, 1];

/**
 * Milliseconds of an ISO 8601 duration in weeks, days, hours, minutes and seconds (P70D, PT3H, -P1DT12H)
 * or of a plain number of seconds; null when it is neither. Months and years are refused: their length varies.
 */
export function durationMs(text: string): number | null {
  if (/^-?\d+$/.test(text)) return Number(text) * 1000;
  const parts = SHAPE.exec(text);
  const numbers = parts?.slice(2) ?? [];
  if (!parts || numbers.every((n) => n === undefined)) return null;
  const seconds = numbers.reduce((sum, n, i) => sum + Number(n ?? 0) * (SECONDS[i] ?? 0), 0);
  return (parts[1] ? -seconds : seconds) * 1000;
}
