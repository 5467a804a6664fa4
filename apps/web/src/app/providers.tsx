import { ChakraProvider } from '@chakra-ui/react';
import { type QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { system } from '../theme/system.js';

interface Props {
  client: QueryClient;
  children: ReactNode;
}

/** What every part of the page stands in; the tests use the same. */
export function Providers({ client, children }: Props) {
  return (
    <ChakraProvider value={system}>
      <QueryClientProvider client={client}>{children}</QueryClientProvider>
    </ChakraProvider>
  );
}
