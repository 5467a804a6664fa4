import { invalid, problem } from '../../platform/errors/problem.js';
import { figureOf, takenOf, wholePart, type Amount, type PartSize } from './proportions.js';

/** What one whole pack makes. */
export interface PackMakes {
  volumeUl: number;
  wholeOnly: boolean;
}

export type NamedPart = PartSize & { name: string };

/** One part of a mix: which, how much of it, and from what. */
export interface PlannedDraw {
  part: NamedPart;
  taken: Amount;
}

const litres = (volumeUl: number): string => String(volumeUl / 1_000_000);

/**
 * How much of each part the mix takes.
 * @throws Problem 'more-than-pack-makes', 'whole-only'
 */
export function planDraws(parts: readonly NamedPart[], makeUl: number, makes: PackMakes): PlannedDraw[] {
  if (makeUl > makes.volumeUl) throw problem('more-than-pack-makes', litres(makes.volumeUl));
  if (makes.wholeOnly && makeUl !== makes.volumeUl) throw problem('whole-only', litres(makes.volumeUl));
  return parts.map((part) => ({ part, taken: takenOf(part, makeUl, makes.volumeUl) }));
}

interface Opened {
  id: string;
  packPartId: string;
  leftUl: number | null;
  leftMg: number | null;
}

/** What is in an opened pack now. */
export const leftIn = ({ packPartId, leftUl, leftMg }: Opened): number =>
  figureOf(wholePart({ packPartId, sizeUl: leftUl, sizeMg: leftMg }));

/**
 * Gives each part the opened pack that it comes from.
 * @throws Problem 'invalid' unless there is one for each part, 'opened-too-little' naming the part
 */
export function matchOpened<T extends Opened>(
  draws: readonly PlannedDraw[],
  opened: readonly T[],
): (PlannedDraw & { from: T })[] {
  const matched = draws.flatMap((draw) => {
    const from = opened.filter((one) => one.packPartId === draw.part.packPartId);
    return from.length === 1 ? from.map((one) => ({ ...draw, from: one })) : [];
  });
  if (matched.length !== draws.length || opened.length !== draws.length) {
    throw invalid([{ field: 'content.from.openedPackIds', message: 'Name one opened pack for each part.' }]);
  }
  for (const { part, taken, from } of matched) {
    if (leftIn(from) < figureOf(taken)) throw problem('opened-too-little', part.name);
  }
  return matched;
}
