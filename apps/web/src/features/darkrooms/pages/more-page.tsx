import { Box, Button, Stack } from '@chakra-ui/react';
import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { ButtonLink } from '../../../shared/ui/links.js';
import { PageHeading, SectionHeading } from '../../../shared/ui/page-heading.js';
import { useMe } from '../../sign-in/api/get-me.js';
import { usePostSignOut } from '../../sign-in/api/post-sign-out.js';

/** The person's own page: where else to go, and out. */
export function MorePage() {
  const { address, id, name, me } = useDarkroom();
  const others = (useMe().data?.darkrooms ?? []).filter((darkroom) => darkroom.id !== id);
  const mayOrder = useMay('technician');
  const signOut = usePostSignOut();
  return (
    <>
      <PageHeading title={me.displayName} says={`${me.role} at ${name}`} />
      <Stack gap="3" maxW="26rem">
        <Box hideFrom="lg">
          <Stack gap="3">
            {mayOrder && <ButtonLink to={paths.orders(address)}>Orders</ButtonLink>}
            {mayOrder && <ButtonLink to={paths.log(address)}>Log</ButtonLink>}
          </Stack>
        </Box>
        {!mayOrder && <ButtonLink to={paths.mixing(address)}>Chemistries</ButtonLink>}
        {others.length > 0 && <SectionHeading>Other darkrooms</SectionHeading>}
        {others.map((darkroom) => (
          <ButtonLink key={darkroom.id} to={paths.sink(darkroom.shortName)}>
            {darkroom.name}
          </ButtonLink>
        ))}
        <Button
          variant="outline"
          minH="11"
          mt="6"
          loading={signOut.isPending}
          onClick={() => signOut.mutate()}
        >
          Sign out
        </Button>
        <FormError
          message={
            signOut.isError ? 'You could not be signed out: there is no signal. Try again.' : undefined
          }
        />
      </Stack>
    </>
  );
}
