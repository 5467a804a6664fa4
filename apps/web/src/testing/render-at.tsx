import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { Providers } from '../app/providers.js';
import { createQueryClient } from '../app/query-client.js';
import { routes } from '../app/router.js';

/** The whole program at an address, as the browser would have it. */
export function renderAt(address: string) {
  const router = createMemoryRouter(routes, { initialEntries: [address] });
  const client = createQueryClient();
  render(
    <Providers client={client}>
      <RouterProvider router={router} />
    </Providers>,
  );
  return { user: userEvent.setup(), router, client };
}
