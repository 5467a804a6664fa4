import { chakra } from '@chakra-ui/react';

/** A code on its strip of tape. Nothing else has this colour. */
export const Tape = chakra('span', {
  base: {
    display: 'inline-block',
    px: '2',
    fontWeight: '700',
    bg: 'tape',
    color: 'tape.ink',
    borderWidth: '1px',
    borderColor: 'tape.edge',
    borderRadius: 'tape',
    whiteSpace: 'nowrap',
  },
});
