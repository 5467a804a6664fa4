import { Box, chakra, Flex } from '@chakra-ui/react';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { TextLink } from '../../../shared/ui/links.js';
import { StateMark, stateWord } from '../../../shared/ui/state-mark.js';
import { Tape } from '../../../shared/ui/tape.js';
import { limitWords, type Standing } from '../../bottles/standing.js';

interface Props {
  standing: Standing;
  onOpen: () => void;
  /** Film goes through this one, so that its row opens the sheet. */
  takesLoads: boolean;
}

const RowButton = chakra('button', {
  base: { flex: '1', minW: '0', minH: '19', py: '2', textAlign: 'left', cursor: 'pointer' },
});

function Words({ standing }: { standing: Standing }) {
  const { bottle, assessment, sentence } = standing;
  const limit = limitWords(standing);
  return (
    <>
      <Flex gap="2" align="center" wrap="wrap">
        <Tape>{bottle.code}</Tape>
        <Box as="span" fontWeight="600" minW="0">
          {bottle.name}
        </Box>
      </Flex>
      <Box fontSize="lead">{sentence}</Box>
      {limit && limit !== sentence && <Box color="ink.muted">{limit}</Box>}
      <StateMark verdict={assessment.verdict} />
    </>
  );
}

/** 'FX-02, Rapid fixer: 4 rolls left, to 3 Jan. Capacity gives out first. Low.' */
function rowLabel(standing: Standing): string {
  const { bottle, assessment, sentence } = standing;
  const state = stateWord(assessment.verdict);
  return [`${bottle.code}, ${bottle.name}: ${sentence}.`, limitWords(standing), state && `${state}.`]
    .filter(Boolean)
    .join(' ');
}

/** A bottle at the sink: its code and name, how it stands, what ends it. The row opens its load sheet. */
export function SinkRow({ standing, onOpen, takesLoads }: Props) {
  const { address } = useDarkroom();
  const { code } = standing.bottle;
  return (
    <Flex as="li" gap="3" align="center" borderBottomWidth="1px" borderColor="line">
      {takesLoads ? (
        <RowButton type="button" onClick={onOpen} aria-label={rowLabel(standing)}>
          <Words standing={standing} />
        </RowButton>
      ) : (
        <Box flex="1" minW="0" minH="19" py="2">
          <Words standing={standing} />
        </Box>
      )}
      <TextLink
        to={paths.bottle(address, code)}
        display="inline-flex"
        alignItems="center"
        minH="11"
        minW="11"
        aria-label={`All about ${code}`}
      >
        Open
      </TextLink>
    </Flex>
  );
}
