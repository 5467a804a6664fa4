import { Box, Button, Flex, Stack } from '@chakra-ui/react';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import type { Standing } from '../../bottles/standing.js';
import { closedWords, codesOf, type LoadPlan } from '../load-plan.js';

interface Props {
  plan: LoadPlan;
  /** The sheet is of several baths, so that one of them can be left out. */
  several: boolean;
  onReport: (bath: Standing) => void;
}

function ClosedBath({ bath, onReport }: { bath: Standing; onReport: () => void }) {
  return (
    <Box>
      <Flex gap="2" align="baseline" color="state.stop">
        <ShapeMark shape="octagon" />
        <span>{closedWords(bath)}</span>
      </Flex>
      <Button variant="plain" px="0" minH="11" textDecoration="underline" onClick={onReport}>
        It has been through {bath.bottle.code} already
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
          <span>{over.words}</span>
        </Flex>
      ))}
      {plan.instead.map((words) => (
        <Box key={words}>{words}</Box>
      ))}
      {plan.leaves && <Box fontWeight="600">{plan.leaves}</Box>}
      {plan.closed.map((bath) => (
        <ClosedBath key={bath.bottle.id} bath={bath} onReport={() => onReport(bath)} />
      ))}
      {plan.blocking.length > 0 && (
        <Box>
          Nothing is put through while {codesOf(plan.blocking)} cannot be used.
          {several && ' Leave it out by its tape, above, if this film does without.'}
        </Box>
      )}
      {plan.through.length === 0 && plan.closed.length === 0 && <Box>No bottle is in this load.</Box>}
    </Stack>
  );
}
