import { Box, chakra, Flex } from '@chakra-ui/react';
import { showDilution } from '@wetside/chemistry';
import type { ChemistryView } from '../../../shared/api/types.js';
import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { ButtonLink } from '../../../shared/ui/links.js';
import { figureWords } from '../figure-words.js';

function Chemistry({ chemistry }: { chemistry: ChemistryView }) {
  const { address } = useDarkroom();
  const mayMix = useMay('technician');
  const { document } = chemistry;
  const figures = figureWords(document);
  return (
    <Box as="li" py="4" borderTopWidth="1px" borderColor="line">
      <Flex gap="3" justify="space-between" wrap="wrap">
        <Box flex="1 1 14rem" minW="0">
          <chakra.h2 fontSize="lead" fontWeight="700">
            {document.name}
          </chakra.h2>
          <Box color="ink.muted">
            {document.role.replaceAll('-', ' ')}, {showDilution(document.dilution)}, {document.use}
          </Box>
        </Box>
        {mayMix && <ButtonLink to={paths.newMix(address, chemistry.id)}>Mix {document.name}</ButtonLink>}
      </Flex>
      {figures.length === 0 && <Box mt="2">Capacity and keeping are not known.</Box>}
      <chakra.ul listStyleType="none" mt="2">
        {figures.map(({ words, source }) => (
          <li key={`${words} ${source}`}>
            {words}{' '}
            <Box as="span" color="ink.muted">
              {source}
            </Box>
          </li>
        ))}
      </chakra.ul>
    </Box>
  );
}

/** The chemistries of the darkroom, every figure with its source. */
export function ChemistryList({ chemistries }: { chemistries: readonly ChemistryView[] }) {
  if (chemistries.length === 0) return <Box>This darkroom has no chemistries yet.</Box>;
  return (
    <chakra.ul listStyleType="none" aria-label="Chemistries">
      {chemistries.map((chemistry) => (
        <Chemistry key={chemistry.id} chemistry={chemistry} />
      ))}
    </chakra.ul>
  );
}
