import { fireEvent, screen, waitFor } from '@testing-library/react';
import { expect, it } from 'vitest';
import { fakeApi } from '../testing/fake-api.js';
import { darkroom, me } from '../testing/fixtures.js';
import { pack } from '../testing/order-fixtures.js';
import { renderAt } from '../testing/render-at.js';

it('warns that an expiry date is past, and takes it all the same', async () => {
  const api = fakeApi({
    'GET /me': () => ({ body: me('technician') }),
    'GET /darkrooms/harbour': () => ({ body: darkroom('technician') }),
    'GET /darkrooms/harbour/shelf': () => ({ body: { packs: [pack] } }),
    'PUT /darkrooms/harbour/receipts/*': () => ({ body: { shelf: { packs: [pack] } } }),
  });
  const { user } = renderAt('/d/harbour/shelf/receive');
  const expires = await screen.findByLabelText('Expires');
  expect(screen.queryByText('That date is past.')).not.toBeInTheDocument();
  fireEvent.change(expires, { target: { value: '2020-05-01' } });
  expect(await screen.findByText('That date is past.')).toBeVisible();
  await user.type(screen.getByLabelText('Lot number'), 'L-1');
  await user.click(screen.getByRole('button', { name: 'Put on the shelf' }));
  await waitFor(() => expect(api.sent('PUT')).toHaveLength(1));
  expect(api.sent('PUT')[0]?.body).toMatchObject({ content: { lines: [{ expiresOn: '2020-05-01' }] } });
});
