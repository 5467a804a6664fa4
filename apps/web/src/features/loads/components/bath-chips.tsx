import { chakra, Flex } from '@chakra-ui/react';
import { Tape } from '../../../shared/ui/tape.js';
import type { Standing } from '../../bottles/standing.js';

interface Props {
  baths: readonly Standing[];
  isIn: (standing: Standing) => boolean;
  onToggle: (bath: Standing) => void;
}

const Chip = chakra('button', {
  base: {
    minH: '11',
    minW: '11',
    cursor: 'pointer',
    display: 'inline-flex',
    alignItems: 'center',
    gap: '1',
    '&[aria-pressed=false] span': { textDecoration: 'line-through', bg: 'transparent' },
  },
});

/** The baths of the load; a tap leaves one out, or takes one in instead of another of its role. */
export function BathChips({ baths, isIn, onToggle }: Props) {
  return (
    <Flex role="group" aria-label="Through" wrap="wrap" gap="2">
      {baths.map((bath) => (
        <Chip
          key={bath.bottle.id}
          type="button"
          aria-pressed={isIn(bath)}
          aria-label={`${bath.bottle.code} ${bath.bottle.name}`}
          onClick={() => onToggle(bath)}
        >
          <Tape>{bath.bottle.code}</Tape>
        </Chip>
      ))}
    </Flex>
  );
}
