import { Box } from '@chakra-ui/react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { useMe } from '../features/sign-in/api/get-me.js';
import { paths } from '../shared/routes/paths.js';
import { Fetched } from '../shared/ui/fetched.js';

/** Everything behind it is for people who are signed in. */
export function SignInGate() {
  const query = useMe();
  const { pathname, search } = useLocation();
  if (query.data === null) return <Navigate to={paths.signIn} replace state={{ to: pathname + search }} />;
  if (query.data) return <Outlet />;
  return (
    <Box as="main" p="4">
      <Fetched query={query} what="your darkrooms">
        {() => null}
      </Fetched>
    </Box>
  );
}
