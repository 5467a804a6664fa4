import { Box, Button, Flex } from '@chakra-ui/react';
import { onlineManager } from '@tanstack/react-query';
import { useSyncExternalStore } from 'react';
import { useStore } from '../store.js';
import { CodeWords } from '../ui/code-words.js';
import { clearStrip, type Strip, strip as stripStore } from './strip.store.js';
import { useUndo } from './use-undo.js';

function wordsFor({ state, words, why }: Strip, online: boolean): string {
  if (state === 'unsent') return `${why ?? 'No signal.'} Not sent yet: ${words}`;
  return state === 'sending' && !online ? `No signal. Not sent yet: ${words}` : words;
}

const useOnline = (): boolean =>
  useSyncExternalStore(
    (listener) => onlineManager.subscribe(listener),
    () => onlineManager.isOnline(),
  );

/**
 * What was just done, said once to a screen reader, and the way back. Where the page is worked on with wet hands it lies
 * over the heading and stays in sight, so that nothing moves under a finger when it comes and goes.
 */
export function ActionStrip({ over = false }: { over?: boolean }) {
  const strip = useStore(stripStore);
  const undo = useUndo();
  const online = useOnline();
  return (
    <Box
      role="status"
      aria-label="What was just done"
      {...(over && { position: 'sticky', top: '0', h: '0', mx: '-4', zIndex: 'docked' })}
    >
      {strip && (
        <Flex
          align="center"
          gap="3"
          wrap="wrap"
          px="4"
          py="2"
          mb="4"
          // Over a heading it hides the whole of it: half a sentence is worse than none.
          minH={over ? '5.5rem' : undefined}
          bg="surface"
          borderBottomWidth="1px"
          borderColor="rule"
        >
          <Box flex="1 1 8rem" color={strip.state === 'refused' ? 'state.stop' : 'ink'}>
            <CodeWords>{wordsFor(strip, online)}</CodeWords>
          </Box>
          {strip.state === 'unsent' && strip.again && (
            <Button variant="outline" minH="11" onClick={strip.again}>
              Try again
            </Button>
          )}
          {strip.canUndo && (
            <Button variant="outline" minH="11" onClick={() => undo(strip)}>
              Undo
            </Button>
          )}
          <Button variant="plain" minH="11" px="2" onClick={clearStrip}>
            Close
          </Button>
        </Flex>
      )}
    </Box>
  );
}
