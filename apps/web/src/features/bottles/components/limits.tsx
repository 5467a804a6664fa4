import { Box, chakra, Grid } from '@chakra-ui/react';
import type { LimitKind } from '@wetside/chemistry';
import { sourceWords } from '../../../shared/formats/source-words.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import { SectionHeading } from '../../../shared/ui/page-heading.js';
import type { Standing } from '../standing.js';

const names: Record<LimitKind, string> = {
  capacity: 'Capacity',
  date: 'Date',
  volume: 'Volume',
  test: 'Tests',
  hold: 'Hold',
  ready: 'Ready',
};

/** Every limit of the bottle with its figure and where that was read. */
export function Limits({ standing }: { standing: Standing }) {
  const { assessment, document } = standing;
  return (
    <section aria-labelledby="limits">
      <SectionHeading id="limits">What limits it, tightest first</SectionHeading>
      {assessment.limits.length === 0 && <Box>No limit is known for this chemistry.</Box>}
      <chakra.ul listStyleType="none">
        {assessment.limits.map((limit) => (
          <Grid
            as="li"
            key={`${limit.kind} ${limit.material ?? ''} ${limit.text}`}
            templateColumns={{ base: '6rem 1fr', md: '7rem 1fr 1fr' }}
            gap="2"
            py="3"
            borderTopWidth="1px"
            borderColor="line"
          >
            <Box display="flex" gap="2" alignItems="baseline" fontWeight={limit.closes ? '700' : '400'}>
              {limit.closes && <ShapeMark shape="octagon" />}
              {names[limit.kind]}
            </Box>
            <Box fontWeight="600">{limit.text}</Box>
            <Box color="ink.muted" gridColumn={{ base: '2', md: 'auto' }}>
              {sourceWords(document, limit.sourceKeys).map((words) => (
                <div key={words}>{words}</div>
              ))}
            </Box>
          </Grid>
        ))}
      </chakra.ul>
    </section>
  );
}
