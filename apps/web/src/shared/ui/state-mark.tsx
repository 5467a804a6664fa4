import { Box, chakra } from '@chakra-ui/react';
import type { Verdict } from '@wetside/chemistry';

export type Shape = 'octagon' | 'triangle' | 'none';

const shapes: Record<Verdict, Shape> = {
  open: 'none',
  low: 'triangle',
  'near-date': 'triangle',
  'not-ready': 'triangle',
  'volume-short': 'octagon',
  spent: 'octagon',
  'past-date': 'octagon',
  'on-hold': 'octagon',
  discarded: 'octagon',
};

const words: Record<Verdict, string> = {
  open: '',
  low: 'low',
  'near-date': 'near its date',
  'not-ready': 'not ready yet',
  'volume-short': 'too little for a tank',
  spent: 'spent',
  'past-date': 'past its date',
  'on-hold': 'on hold',
  discarded: 'discarded',
};

export const shapeOf = (verdict: Verdict): Shape => shapes[verdict];
export const stateWord = (verdict: Verdict): string => words[verdict];

/** The bare shape; the words beside it carry the meaning. */
export function ShapeMark({ shape, inline = false }: { shape: Shape; inline?: boolean }) {
  if (shape === 'none') return null;
  const stop = shape === 'octagon';
  return (
    <chakra.svg
      viewBox="0 0 16 16"
      w="4"
      h="4"
      flex="none"
      display={inline ? 'inline-block' : 'block'}
      verticalAlign="text-bottom"
      me={inline ? '1' : '0'}
      aria-hidden="true"
      color={stop ? 'state.stop' : 'state.watch'}
    >
      {stop ? (
        <path d="M5 1h6l4 4v6l-4 4H5l-4-4V5z" fill="currentColor" />
      ) : (
        <path d="M8 2 15 14H1z" fill="none" stroke="currentColor" strokeWidth="2" />
      )}
    </chakra.svg>
  );
}

/** State as shape, then word, then colour. A bottle that nothing limits shows nothing. */
export function StateMark({ verdict }: { verdict: Verdict }) {
  const shape = shapes[verdict];
  if (shape === 'none') return null;
  return (
    <Box
      as="span"
      display="inline-flex"
      alignItems="center"
      gap="1.5"
      fontWeight="600"
      color={shape === 'octagon' ? 'state.stop' : 'state.watch'}
    >
      <ShapeMark shape={shape} />
      {words[verdict]}
    </Box>
  );
}
