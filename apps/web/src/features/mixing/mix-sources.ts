import { showDate, showVolume, type LocalDate } from '@wetside/chemistry';
import type {
  ChemistryFrom,
  ChemistryView,
  Lot,
  MixFrom,
  OpenedPack,
  ShelfPack,
} from '../../shared/api/types.js';
import { byExpiry, expiryWords, isExpired } from '../shelf/lot-expiry.js';

/** Where a mix can come from, with what it can make at most. */
export interface MixSource {
  value: string;
  label: string;
  note: string;
  /** Its lot has expired. */
  isPast?: boolean;
  from: MixFrom;
  /** The most it makes; null where nobody counts. */
  maxUl: number | null;
  /** A powder is mixed whole: this volume and no other. */
  wholeUl: number | null;
  leaves: (volumeUl: number) => string | null;
}

const byHand: MixSource = {
  value: 'hand',
  label: 'Measured by hand',
  note: 'nothing leaves the shelf',
  from: { kind: 'hand' },
  maxUl: null,
  wholeUl: null,
  leaves: () => null,
};

const reorderWords = (left: number, point: number | null): string => {
  if (point === null) return '';
  return left <= point ? `, which is its reorder point (${point}): order more` : `, reorder at ${point}`;
};

const shareLeft = (pack: ShelfPack, opened: OpenedPack): number => {
  const part = pack.parts.find(({ id }) => id === opened.partId);
  if (part?.sizeUl && opened.leftUl !== null) return opened.leftUl / part.sizeUl;
  if (part?.sizeMg && opened.leftMg !== null) return opened.leftMg / part.sizeMg;
  return 1;
};

function newPack(pack: ShelfPack, lot: Lot, from: ChemistryFrom, today: LocalDate): MixSource {
  const left = pack.unopened - 1;
  const [part] = pack.parts;
  const rest = (volumeUl: number): string => {
    const restUl = part?.sizeUl ? Math.floor(part.sizeUl * (1 - volumeUl / from.volumeUl)) : 0;
    return pack.parts.length === 1 && restUl > 0 ? ` and ${showVolume(restUl)} in the opened pack` : '';
  };
  const isPast = isExpired(lot, today);
  const expiry = lot.expiresOn
    ? `, to ${showDate(lot.expiresOn, today)}${lot.expiryIsGuess ? ' (a guess)' : ''}`
    : '';
  return {
    value: `lot:${lot.id}`,
    label: `New pack of ${pack.name}, lot ${lot.lotNumber}`,
    note: `${lot.unopened} on the shelf${isPast ? `, ${expiryWords(lot, today)}` : expiry}`,
    isPast,
    from: { kind: 'lot', lotId: lot.id },
    maxUl: from.volumeUl,
    wholeUl: from.wholeOnly ? from.volumeUl : null,
    leaves: (volumeUl) => `${left} on the shelf${reorderWords(left, pack.reorderPoint)}${rest(volumeUl)}`,
  };
}

function openedPack(
  pack: ShelfPack,
  lot: Lot,
  parts: readonly OpenedPack[],
  from: ChemistryFrom,
  today: LocalDate,
): MixSource[] {
  const [first] = parts;
  if (!first || parts.length < pack.parts.length) return [];
  const maxUl = Math.floor(from.volumeUl * Math.min(...parts.map((part) => shareLeft(pack, part))));
  if (maxUl <= 0) return [];
  const isPast = isExpired(lot, today);
  const ends = isPast ? `, ${expiryWords(lot, today)}` : ': use first';
  const amount = parts.flatMap(({ leftUl }) => (leftUl === null ? [] : [showVolume(leftUl)])).join(' + ');
  const leaves = (volumeUl: number): string | null => {
    const leftUl = first.leftUl === null ? 0 : Math.floor(first.leftUl * (1 - volumeUl / maxUl));
    return parts.length === 1 ? `${showVolume(Math.max(0, leftUl))} in the opened pack` : null;
  };
  return [
    {
      value: `opened:${parts.map(({ id }) => id).join(',')}`,
      label: `Opened pack of ${pack.name}, lot ${lot.lotNumber}`,
      note: `${amount ? `${amount} left, ` : ''}opened ${showDate(first.openedOn, today)}${ends}`,
      isPast,
      from: { kind: 'opened', openedPackIds: parts.map(({ id }) => id) },
      maxUl,
      wholeUl: null,
      leaves,
    },
  ];
}

/** Opened packs serve when every part of one stands open; the oldest of each part go together. */
function openedPacks(pack: ShelfPack, lot: Lot, from: ChemistryFrom, today: LocalDate): MixSource[] {
  const byPart = pack.parts.map((part) =>
    lot.opened
      .filter(({ partId }) => partId === part.id)
      .sort((a, b) => a.openedOn.localeCompare(b.openedOn)),
  );
  const most = Math.max(0, ...byPart.map((opened) => opened.length));
  return Array.from({ length: most }, (_, at) =>
    byPart.flatMap((opened) => opened.slice(at, at + 1)),
  ).flatMap((parts) => openedPack(pack, lot, parts, from, today));
}

/** Opened packs first, then lots by their date, then what has expired, then by hand. */
export function mixSources(
  chemistry: ChemistryView,
  packs: readonly ShelfPack[],
  today: LocalDate,
): MixSource[] {
  const stock = chemistry.from.flatMap((from) => {
    const pack = packs.find(({ id }) => id === from.packId);
    return pack ? [...pack.lots].sort(byExpiry).map((lot) => ({ pack, lot, from })) : [];
  });
  const sources = [
    ...stock.flatMap(({ pack, lot, from }) => openedPacks(pack, lot, from, today)),
    ...stock.flatMap(({ pack, lot, from }) => (lot.unopened > 0 ? [newPack(pack, lot, from, today)] : [])),
  ];
  return [...sources.filter(({ isPast }) => !isPast), ...sources.filter(({ isPast }) => isPast), byHand];
}
