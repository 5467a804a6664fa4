import { Box, chakra, Flex, Stack } from '@chakra-ui/react';
import { type Container, localDate, type Material, roundLeftDown, showDate } from '@wetside/chemistry';
import type { ChemistryView } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useNow } from '../../../shared/clock/use-now.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { countOf } from '../../../shared/formats/amounts.js';
import { sourceWords } from '../../../shared/formats/source-words.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import { Tape } from '../../../shared/ui/tape.js';
import { hypotheticalBottle } from '../hypothetical-bottle.js';
import { lateWords } from '../late-words.js';
import { measureLines } from '../measure-words.js';
import type { MixSource } from '../mix-sources.js';

interface Props {
  chemistry: ChemistryView;
  source: MixSource;
  volumeUl: number;
  container: Container;
  material: Material | null;
  happenedAt: string;
}

const Heading = chakra('h3', { base: { fontWeight: '700', mt: '3' } });

/** What will happen: the code, what to measure out, what the bottle will be good for, what it leaves on the shelf. */
export function MixPreview({ chemistry, source, volumeUl, container, material, happenedAt }: Props) {
  const darkroom = useDarkroom();
  const now = useNow();
  const { document, nextCode } = chemistry;
  const future = hypotheticalBottle({ document, volumeUl, container, material, happenedAt }, darkroom, now);
  const rated = material ? future?.ratedE4[material] : null;
  const lastDay = future?.lastDay ?? null;
  const sources = sourceWords(document, future?.limits.flatMap((limit) => limit.sourceKeys) ?? []);
  const late = lateWords(lastDay, localDate(happenedAt, darkroom.zone), today(darkroom.zone));
  const leaves = source.leaves(volumeUl);
  return (
    <Stack gap="1">
      <Box>
        <Tape fontSize="lead">{nextCode}</Tape>
      </Box>
      <Box fontSize="figure" fontWeight="700" lineHeight="1.2">
        {typeof rated === 'number'
          ? countOf(roundLeftDown(rated), material === 'film' ? 'roll' : 'print')
          : 'Capacity not known'}
        {lastDay ? `, until ${showDate(lastDay, today(darkroom.zone))}` : ', keeping time not known'}
      </Box>
      {late && (
        <Flex role="status" gap="2" align="baseline" color="state.stop" fontWeight="600">
          <ShapeMark shape="octagon" />
          <span>{late}</span>
        </Flex>
      )}
      {sources.map((words) => (
        <Box key={words} color="ink.muted">
          {words}
        </Box>
      ))}
      <Heading>Measure out</Heading>
      <Box as="ol" ps="5" listStyleType="decimal">
        {measureLines(document, material, volumeUl, darkroom.units.temperature).map((line) => (
          <li key={line}>{line}</li>
        ))}
      </Box>
      {document.readyAfter && <Box>Ready later: {document.readyAfter.why}.</Box>}
      <Heading>Mind</Heading>
      <Box as="ul" ps="5" listStyleType="disc" color="ink.muted">
        {[...document.cautions, document.hazardNote].map((words) => (
          <li key={words}>{words}</li>
        ))}
      </Box>
      {leaves && (
        <>
          <Heading>Leaves</Heading>
          <Box color="ink.muted">{leaves}.</Box>
        </>
      )}
    </Stack>
  );
}
