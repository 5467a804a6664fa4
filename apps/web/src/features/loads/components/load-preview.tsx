import { Box, Button, Flex, Stack } from '@chakra-ui/react';
import { CodeWords } from '../../../shared/ui/code-words.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import type { Standing } from '../../bottles/standing.js';
import { closedWords, codesOf, leftOutWords, type LoadPlan } from '../load-plan.js';

interface Props {
  plan: LoadPlan;
  /** The sheet is of several baths, so that one of them can be left out. */
  several: boolean;
  onReport: (bath: Standing) => void;
}

function StopWords({ words }: { words: string }) {
  return (
    <Flex gap="2" align="baseline" color="state.stop">
      <ShapeMark shape="octagon" />
      <span>
        <CodeWords>{words}</CodeWords>
      </span>
    </Flex>
  );
}

interface ClosedBathProps {
  bath: Standing;
  blocks: boolean;
  onReport: () => void;
}

function ClosedBath({ bath, blocks, onReport }: ClosedBathProps) {
  return (
    <Box>
      <StopWords words={blocks ? closedWords(bath) : leftOutWords(bath)} />
      <Button variant="plain" px="0" minH="11" textDecoration="underline" onClick={onReport}>
        <CodeWords>{`It has been through ${bath.bottle.code} already`}</CodeWords>
      </Button>
    </Box>
  );
}

/** What the load leaves, what it is over by, and what cannot be used: said before, never after. */
export function LoadPreview({ plan, several, onReport }: Props) {
  return (
    <Stack gap="1" borderTopWidth="1px" borderColor="line" pt="2">
      {plan.over.map((over) => (
        <Flex key={over.code} gap="2" align="baseline" color="state.watch" fontWeight="600">
          <ShapeMark shape="triangle" />
          <span>
            <CodeWords>{over.words}</CodeWords>
          </span>
        </Flex>
      ))}
      {plan.instead.map((words) => (
        <Box key={words}>
          <CodeWords>{words}</CodeWords>
        </Box>
      ))}
      {plan.leaves && (
        <Box fontWeight="600">
          <CodeWords>{plan.leaves}</CodeWords>
        </Box>
      )}
      {plan.reported.map((bath) => (
        <StopWords key={bath.bottle.id} words={closedWords(bath)} />
      ))}
      {plan.closed.map((bath) => (
        <ClosedBath
          key={bath.bottle.id}
          bath={bath}
          blocks={plan.blocking.includes(bath)}
          onReport={() => onReport(bath)}
        />
      ))}
      {plan.blocking.length > 0 && (
        <Box>
          <CodeWords>{`Nothing is put through while ${codesOf(plan.blocking)} cannot be used.`}</CodeWords>
          {several && ' Leave it out by its tape, above, if this film does without.'}
        </Box>
      )}
      {plan.through.length === 0 && plan.closed.length === 0 && <Box>No bottle is in this load.</Box>}
    </Stack>
  );
}
