import { scaleDown } from './fraction.js';

export type ContainerState = 'full' | 'part-full' | 'floating-lid' | 'open-tray';
export type ContainerMaterial = 'glass' | 'pet' | 'soft-polyethylene' | 'concertina';
export type ContainerKind = 'bottle' | 'floating-lid' | 'tray' | 'tank';

/** What a solution stands in. Sizes are whole microlitres. */
export interface Container {
  sizeUl: number;
  kind: ContainerKind;
  material?: ContainerMaterial;
}

/** A container below this share of its size (1/10,000) counts as part full. Common practice, no source. */
export const partFullBelowE4 = 7_500;

/** The state that decides how long a solution keeps. A share of the size exactly at the mark is full. */
export function containerState(
  container: Container,
  volumeUl: number,
  belowE4: number = partFullBelowE4,
): ContainerState {
  if (container.kind === 'tray') return 'open-tray';
  if (container.kind === 'floating-lid') return 'floating-lid';
  // A concertina bottle is squeezed to its contents, so no air stands over them.
  if (container.material === 'concertina') return 'full';
  return volumeUl * 10_000 < container.sizeUl * belowE4 ? 'part-full' : 'full';
}

/** The size at and above which nothing is part full, in microlitres, rounded down. */
export const fullFromUl = (container: Container): number =>
  scaleDown(container.sizeUl, partFullBelowE4, 10_000);
