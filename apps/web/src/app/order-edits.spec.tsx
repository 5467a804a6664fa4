import { fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { OrderPageData, OrderView, ReceiptContent } from '../shared/api/types.js';
import { keptKey } from '../shared/api/query-keys.js';
import { actionView } from '../testing/fixtures.js';
import { fakeApi } from '../testing/fake-api.js';
import { order, orderPage } from '../testing/order-fixtures.js';
import { renderAt } from '../testing/render-at.js';

const [line] = order('draft').lines;
const withCount = (count: number, more: Partial<OrderView> = {}): OrderView =>
  order('draft', { lines: line ? [{ ...line, count }] : [], ...more });

/** A draft that somebody else saves while it is edited here. */
function editedByTwo() {
  const server: { order: OrderView } = { order: withCount(3) };
  const api = fakeApi({
    ...orderPage(server.order),
    'GET /darkrooms/harbour/orders/o-2': () => ({
      body: { order: server.order, mailText: 'Please send' } satisfies OrderPageData,
    }),
    'PATCH /darkrooms/harbour/orders/o-2': ({ body }) => {
      const { revision } = body as { revision: number };
      if (revision !== server.order.revision)
        return { status: 409, body: { code: 'order-changed', detail: 'The order was changed.' } };
      server.order = { ...server.order, revision: revision + 1 };
      return { body: { order: server.order } };
    },
  });
  const page = renderAt('/d/harbour/orders/o-2');
  const count = () => screen.findByRole('textbox', { name: /^Count/ });
  const fetchAgain = () => page.client.invalidateQueries({ queryKey: keptKey('harbour', 'order') });
  return { api, server, count, fetchAgain, ...page };
}
const changed = () => screen.findByText(/^Somebody else has saved this draft meanwhile\./);

describe('two people at one draft', () => {
  it('the second sees what was saved, keeps what was typed, and says which stands', async () => {
    const { api, server, count, user } = editedByTwo();
    fireEvent.change(await count(), { target: { value: '7' } });
    server.order = withCount(5, { revision: 2, note: 'ring twice' });
    await user.click(screen.getByRole('button', { name: 'Save draft' }));
    expect(await changed()).toBeVisible();
    expect(await count()).toHaveValue('7');
    expect(await count()).toHaveAccessibleDescription(/Saved now: 5/);
    expect(screen.getByRole('button', { name: 'Save draft' })).toBeDisabled();
    await user.click(screen.getByRole('button', { name: 'Go on with mine' }));
    // Theirs where nothing was typed here, mine where it was.
    await waitFor(() => expect(screen.getByLabelText('Note to the supplier')).toHaveValue('ring twice'));
    expect(await count()).toHaveValue('7');
    await user.click(screen.getByRole('button', { name: 'Save draft' }));
    await waitFor(() => expect(api.sent('PATCH')).toHaveLength(2));
    expect(api.sent('PATCH')[1]?.body).toMatchObject({
      revision: 2,
      note: 'ring twice',
      lines: [{ count: 7 }],
    });
  });

  it('a line that was taken out meanwhile, and changed here, is not lost', async () => {
    const { api, server, count, fetchAgain, user } = editedByTwo();
    fireEvent.change(await count(), { target: { value: '7' } });
    server.order = order('draft', { revision: 2, lines: [] });
    await fetchAgain();
    expect(await changed()).toBeVisible();
    expect(await count()).toHaveAccessibleDescription(/Saved now: 0/);
    await user.click(screen.getByRole('button', { name: 'Go on with mine' }));
    await user.click(screen.getByRole('button', { name: 'Save draft' }));
    await waitFor(() => expect(api.sent('PATCH')).toHaveLength(1));
    expect(api.sent('PATCH')[0]?.body).toMatchObject({ revision: 2, lines: [{ id: 'l-1', count: 7 }] });
  });

  it('takes what is saved when the person says so, and follows it while nothing is typed', async () => {
    const { server, count, fetchAgain, user } = editedByTwo();
    await count();
    server.order = withCount(4, { revision: 2 });
    await fetchAgain();
    await waitFor(async () => expect(await count()).toHaveValue('4'));
    fireEvent.change(await count(), { target: { value: '9' } });
    server.order = withCount(5, { revision: 3 });
    await fetchAgain();
    await changed();
    await user.click(screen.getByRole('button', { name: 'Take what is saved' }));
    await waitFor(async () => expect(await count()).toHaveValue('5'));
    expect(screen.queryByText(/^Somebody else has saved/)).not.toBeInTheDocument();
  });
});

it('more than was ordered is asked about once, at its count, and then received', async () => {
  let asked: ReceiptContent | null = null;
  const api = fakeApi({
    ...orderPage(order('sent')),
    'PUT /darkrooms/harbour/receipts/*': ({ body, path }) => {
      asked = (body as { content: ReceiptContent }).content;
      const errors = [{ field: 'content.lines.0.count', message: 'More than is open on the order.' }];
      if (!asked.overDeliveryOk)
        return { status: 422, body: { code: 'more-than-ordered', detail: 'More came.', errors } };
      const action = actionView(path.split('/').at(-1) ?? '', 'receipt');
      return { body: { action, shelf: { packs: [] }, order: order('received') } };
    },
  });
  const { user } = renderAt('/d/harbour/orders/o-2');
  const came = await screen.findByLabelText('How many came');
  fireEvent.change(came, { target: { value: '5' } });
  fireEvent.change(screen.getByLabelText('Lot number'), { target: { value: 'L-7' } });
  expect(screen.queryByRole('checkbox')).not.toBeInTheDocument();
  await user.click(screen.getByRole('button', { name: 'Receive these packs' }));
  await waitFor(() => expect(came).toHaveAccessibleDescription(/More than is open on the order\./));
  expect(came).toHaveFocus();
  const kept = () => screen.getByRole('checkbox', { name: 'More came than was ordered, and it is kept.' });
  await user.click(kept());
  // Said of 5, not of 50: another count is asked about anew.
  fireEvent.change(came, { target: { value: '50' } });
  await user.click(screen.getByRole('button', { name: 'Receive these packs' }));
  await waitFor(() => expect(api.sent('PUT')).toHaveLength(2));
  expect(asked).not.toHaveProperty('overDeliveryOk');
  await waitFor(() => expect(kept()).not.toBeChecked());
  await user.click(kept());
  await user.click(screen.getByRole('button', { name: 'Receive these packs' }));
  await waitFor(() => expect(api.sent('PUT')).toHaveLength(3));
  expect(asked).toMatchObject({ overDeliveryOk: true, lines: [{ count: 50 }] });
  expect(await screen.findByText('50 packs are on the shelf.')).toBeVisible();
});
