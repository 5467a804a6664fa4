import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { OrderPageData, OrderView } from '../shared/api/types.js';
import { fakeApi } from '../testing/fake-api.js';
import { darkroom, me } from '../testing/fixtures.js';
import { renderAt } from '../testing/render-at.js';

const draft: OrderView = {
  id: 'o-2',
  number: 2,
  numberText: '0002',
  supplier: { id: 's-1', name: 'Low Quay Supplies', email: 'orders@lowquay.example' },
  state: 'draft',
  currency: 'EUR',
  note: null,
  revision: 1,
  draftedBy: 'Tomas',
  draftedAt: '2026-12-01T09:00:00.000Z',
  sentBy: null,
  sentAt: null,
  totalMinor: 3_450,
  lines: [
    {
      id: 'l-1',
      supplierPackId: 'sp-1',
      packId: 'p-1',
      packName: 'Rapid fixer concentrate, 1 L',
      supplierName: 'LQ 17 rapid fixer, litre',
      count: 3,
      priceMinor: 1_150,
      received: 0,
      cancelled: 0,
    },
  ],
  mail: null,
};

function openDraft() {
  let order = draft;
  const api = fakeApi({
    'GET /me': () => ({ body: me('manager') }),
    'GET /darkrooms/harbour': () => ({ body: darkroom('manager') }),
    'GET /darkrooms/harbour/suppliers': () => ({ body: { suppliers: [] } }),
    'GET /darkrooms/harbour/orders/o-2': () => ({
      body: { order, mailText: 'Please send' } satisfies OrderPageData,
    }),
    'PATCH /darkrooms/harbour/orders/o-2': () => {
      order = {
        ...draft,
        revision: 2,
        totalMinor: 4_600,
        lines: draft.lines.map((line) => ({ ...line, count: 4 })),
      };
      return { body: { order } };
    },
    'PUT /darkrooms/harbour/order-sendings/*': () => ({ body: { order: { ...order, state: 'sent' } } }),
  });
  return { api, ...renderAt('/d/harbour/orders/o-2') };
}
const send = () => screen.findByRole('button', { name: 'Send the order' });

describe('a draft', () => {
  it('cannot be sent while it is not what is seen, and its total follows the fields', async () => {
    const { user } = openDraft();
    expect(await send()).toBeEnabled();
    const count = screen.getByRole('textbox', { name: /^Count/ });
    await user.clear(count);
    expect(screen.getByText(/^The total follows whole packs/)).toBeVisible();
    await user.type(count, '4');
    expect(screen.getByText('Total EUR 46.00')).toBeVisible();
    expect(await send()).toBeDisabled();
    expect(screen.getByText(/^Save the draft first/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Save draft' }));
    await waitFor(async () => expect(await send()).toBeEnabled());
    await user.click(await send());
    expect(screen.getByText(/: 4 packs, EUR 46\.00\?/)).toBeVisible();
  });

  it('asks once before it goes, naming what goes', async () => {
    const { api, user } = openDraft();
    await user.click(await send());
    const question =
      'Send order 0002 to orders@lowquay.example: 3 packs, EUR 34.50? It cannot be taken back.';
    expect(screen.getByText(question)).toBeVisible();
    expect(api.sent('PUT')).toHaveLength(0);
    await user.click(screen.getByRole('button', { name: 'Not yet' }));
    expect(screen.queryByText(question)).not.toBeInTheDocument();
    await user.click(await send());
    await user.click(screen.getByRole('button', { name: 'Send 3 packs' }));
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(1));
    expect(api.sent('PUT')[0]?.body).toMatchObject({ content: { orderId: 'o-2', revision: 1 } });
  });
});
