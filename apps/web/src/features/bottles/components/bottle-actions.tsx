import { Button, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { useMay } from '../../../shared/darkroom/darkroom-context.js';
import { CodeWords } from '../../../shared/ui/code-words.js';
import { HoldSheet } from '../../holds/components/hold-sheet.js';
import { ReleaseSheet } from '../../holds/components/release-sheet.js';
import { LazyLoadSheet } from '../../loads/components/lazy-load-sheet.js';
import { useLoadSheet } from '../../loads/use-load-sheet.js';
import { takesFilm } from '../line-order.js';
import type { Standing } from '../standing.js';
import { DiscardSheet } from './discard-sheet.js';

type Doing = 'hold' | 'release' | 'discard' | null;
const asked = (text: string | null): Doing =>
  text === 'hold' || text === 'release' || text === 'discard' ? text : null;

/** What may be done with this bottle, by what it is and who looks at it. An address may ask for one of them. */
export function BottleActions({ standing }: { standing: Standing }) {
  const [search] = useSearchParams();
  const mayMix = useMay('technician');
  const [doing, setDoing] = useState<Doing>(() => (mayMix ? asked(search.get('do')) : null));
  const sheet = useLoadSheet();
  const { bottle, document, assessment } = standing;
  const { code, totals } = bottle;
  const stands = totals.discardedAt === null;
  // The answer of one sheet may come when another is open.
  const close = (sheet: Doing) => (): void => setDoing((now) => (now === sheet ? null : now));
  return (
    <Flex gap="3" wrap="wrap">
      {takesFilm(standing) && !assessment.closed && (
        <Button minH="13" onClick={() => sheet.open([bottle.id])}>
          <CodeWords>{`Put a load through ${code}`}</CodeWords>
        </Button>
      )}
      {takesFilm(standing) && assessment.closed && (
        <Button
          variant="plain"
          px="0"
          minH="11"
          textDecoration="underline"
          onClick={() => sheet.open([bottle.id], true)}
        >
          <CodeWords>{`It has been through ${code} already`}</CodeWords>
        </Button>
      )}
      {stands && totals.hold === null && (
        <Button variant="outline" minH="11" onClick={() => setDoing('hold')}>
          Hold
        </Button>
      )}
      {stands && totals.hold !== null && mayMix && (
        <Button variant="outline" minH="11" onClick={() => setDoing('release')}>
          Release
        </Button>
      )}
      {stands && mayMix && (
        <Button variant="outline" minH="11" onClick={() => setDoing('discard')}>
          Discard
        </Button>
      )}
      <LazyLoadSheet sheet={sheet} standings={[standing]} />
      <HoldSheet bottle={bottle} open={doing === 'hold'} onClose={close('hold')} />
      <ReleaseSheet bottle={bottle} open={doing === 'release'} onClose={close('release')} />
      <DiscardSheet
        bottle={bottle}
        document={document}
        open={doing === 'discard'}
        onClose={close('discard')}
      />
    </Flex>
  );
}
