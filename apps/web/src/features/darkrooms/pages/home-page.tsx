import { Box, Stack } from '@chakra-ui/react';
import { Navigate } from 'react-router-dom';
import { lastDarkroom } from '../../../shared/darkroom/last-darkroom.js';
import { paths } from '../../../shared/routes/paths.js';
import { ButtonLink } from '../../../shared/ui/links.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useMe } from '../../sign-in/api/get-me.js';

/** The last darkroom of this device; with several and none remembered, the choice. */
export function HomePage() {
  const darkrooms = useMe().data?.darkrooms ?? [];
  const last = darkrooms.find(({ shortName }) => shortName === lastDarkroom());
  const [only] = darkrooms;
  const goTo = last ?? (darkrooms.length === 1 ? only : undefined);
  if (goTo) return <Navigate to={paths.sink(goTo.shortName)} replace />;
  return (
    <Box as="main" maxW="26rem" mx="auto" px="4" py="10">
      <PageHeading
        title="Which darkroom"
        says={
          darkrooms.length === 0 ? 'You belong to no darkroom yet. Ask its manager for an invitation.' : null
        }
      />
      <Stack gap="3">
        {darkrooms.map(({ id, shortName, name }) => (
          <ButtonLink key={id} to={paths.sink(shortName)}>
            {name}
          </ButtonLink>
        ))}
      </Stack>
    </Box>
  );
}
