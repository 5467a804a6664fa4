import { Box, Flex } from '@chakra-ui/react';
import type { NeedsYouRow } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { showInstant } from '../../../shared/formats/instants.js';
import { CodeWords } from '../../../shared/ui/code-words.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import { shapeOfEvent } from '../event-order.js';
import { EventVerb } from './event-verb.js';

/** One thing that needs somebody: its shape, its sentence, why, and one verb. */
export function EventRow({ row }: { row: NeedsYouRow }) {
  const { zone } = useDarkroom();
  return (
    <Flex as="li" gap="3" wrap="wrap" align="center" py="3" borderTopWidth="1px" borderColor="line">
      <Flex gap="3" flex="1 1 18rem" minW="0">
        <Box pt="1.5" w="4" flex="none">
          <ShapeMark shape={shapeOfEvent(row.kind)} />
        </Box>
        <Box minW="0">
          <Box fontSize="lead">
            <CodeWords>{row.sentence}</CodeWords>
          </Box>
          <Box color="ink.muted">
            {row.why && `${row.why}. `}
            Since {showInstant(row.openedAt, zone, today(zone))}.
          </Box>
        </Box>
      </Flex>
      <Box w={{ base: '100%', md: 'auto' }}>
        <EventVerb row={row} />
      </Box>
    </Flex>
  );
}
