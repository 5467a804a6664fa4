import { Box } from '@chakra-ui/react';
import { useParams } from 'react-router-dom';
import { paths } from '../routes/paths.js';
import { ButtonLink } from './links.js';
import { PageHeading } from './page-heading.js';

/** Not there, or another darkroom's: the one page for both. */
export function NotFoundPage({ missing }: { missing: string }) {
  const { darkroom } = useParams();
  const inside = darkroom && missing !== 'darkroom';
  return (
    <Box p={{ base: '4', lg: '0' }}>
      <PageHeading title={`There is no such ${missing} here.`} />
      <ButtonLink to={inside ? paths.sink(darkroom) : paths.home}>
        {inside ? 'To the sink' : 'To the start'}
      </ButtonLink>
    </Box>
  );
}
