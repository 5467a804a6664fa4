import { chakra } from '@chakra-ui/react';
import { Link } from 'react-router-dom';
import { Tape } from '../../shared/ui/tape.js';

const Frame = chakra(Link, {
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: '2',
    minH: '11',
    minW: '11',
    color: 'ink.muted',
    '&[aria-current]': { color: 'ink', fontWeight: '700' },
    '&[aria-current] .words': { borderBottomWidth: '3px', borderColor: 'brand' },
  },
});

interface Props {
  to: string;
  words: string;
  current: boolean;
  count?: number | undefined;
}

/** A place of the darkroom; the one count of the frame stands on tape. */
export function PlaceLink({ to, words, current, count }: Props) {
  return (
    <Frame to={to} aria-current={current ? 'page' : undefined}>
      <span className="words">{words}</span>
      {count !== undefined && count > 0 && <Tape>{count}</Tape>}
    </Frame>
  );
}
