import { Box } from '@chakra-ui/react';
import { showDate, showVolume, type LocalDate } from '@wetside/chemistry';
import type { Lot } from '../../../shared/api/types.js';

interface Props {
  lot: Lot;
  today: LocalDate;
  useFirst: boolean;
}

const isExpired = ({ expiresOn }: Lot, today: LocalDate): boolean => expiresOn !== null && expiresOn < today;

const expiryWords = ({ expiresOn, expiryIsGuess }: Lot, today: LocalDate): string => {
  if (!expiresOn) return 'no expiry date known';
  const past = expiresOn < today ? 'expired' : 'expires';
  return `${past} ${showDate(expiresOn, today)}${expiryIsGuess ? ' (a guess)' : ''}`;
};

/** One lot: what stands there unopened, what is opened, until when. */
export function ShelfLot({ lot, today, useFirst }: Props) {
  return (
    <Box as="li" py="1">
      lot {lot.lotNumber}: {lot.unopened} unopened, {expiryWords(lot, today)}
      {useFirst && !isExpired(lot, today) && <Box as="strong"> use first</Box>}
      {lot.opened.map((opened) => (
        <Box key={opened.id} ps="4">
          opened {showDate(opened.openedOn, today)}, {opened.partName}:{' '}
          {opened.leftUl === null
            ? `${Math.floor((opened.leftMg ?? 0) / 1_000)} g`
            : showVolume(opened.leftUl)}{' '}
          left
        </Box>
      ))}
    </Box>
  );
}
