import { Box } from '@chakra-ui/react';
import { showDate, showVolume, type LocalDate } from '@wetside/chemistry';
import type { Lot } from '../../../shared/api/types.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import { expiryWords, isExpired } from '../lot-expiry.js';

interface Props {
  lot: Lot;
  today: LocalDate;
  useFirst: boolean;
}

/** One lot: what stands there unopened, what is opened, until when. */
export function ShelfLot({ lot, today, useFirst }: Props) {
  return (
    <Box as="li" py="1">
      lot {lot.lotNumber}: {lot.unopened} unopened,{' '}
      {isExpired(lot, today) ? (
        <Box as="span" color="state.stop" fontWeight="600" whiteSpace="nowrap">
          <ShapeMark shape="octagon" inline />
          {expiryWords(lot, today)}
        </Box>
      ) : (
        expiryWords(lot, today)
      )}
      {useFirst && <Box as="strong"> use first</Box>}
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
