import { Box, Button } from '@chakra-ui/react';
import { paths } from '../shared/routes/paths.js';
import { ButtonLink } from '../shared/ui/links.js';
import { PageHeading } from '../shared/ui/page-heading.js';

/** When a page itself fails: nothing that was recorded is lost by it. */
export function BrokenPage() {
  return (
    <Box as="main" maxW="26rem" mx="auto" px="4" py="10">
      <PageHeading title="This page broke." says="What was recorded is safe. Fetch the page again." />
      <Box display="flex" gap="3" flexWrap="wrap">
        <Button minH="11" onClick={() => window.location.reload()}>
          Fetch it again
        </Button>
        <ButtonLink to={paths.home}>To the start</ButtonLink>
      </Box>
    </Box>
  );
}
