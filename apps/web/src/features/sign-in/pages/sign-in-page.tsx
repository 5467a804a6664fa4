import { Box } from '@chakra-ui/react';
import { Navigate, useLocation } from 'react-router-dom';
import { paths } from '../../../shared/routes/paths.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useMe } from '../api/get-me.js';
import { SignInForm } from '../components/sign-in-form.js';

/** Where the person wanted to go; only ever an address of this program. */
function wanted(state: unknown): string {
  const to = (state as { to?: unknown } | null)?.to;
  return typeof to === 'string' && to.startsWith('/') && !to.startsWith('//') ? to : paths.home;
}

export function SignInPage() {
  const { data: me } = useMe();
  const { state } = useLocation() as { state: unknown };
  if (me) return <Navigate to={wanted(state)} replace />;
  return (
    <Box as="main" maxW="26rem" mx="auto" px="4" py="10">
      <PageHeading title="Wetside" says="Sign in to your darkroom." />
      <SignInForm />
    </Box>
  );
}
