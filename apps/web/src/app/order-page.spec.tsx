import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { OrderPageData } from '../shared/api/types.js';
import { fakeApi } from '../testing/fake-api.js';
import { darkroom, me } from '../testing/fixtures.js';
import { order } from '../testing/order-fixtures.js';
import { renderAt } from '../testing/render-at.js';

const draft = order('draft');

function openDraft() {
  let shown = draft;
  const api = fakeApi({
    'GET /me': () => ({ body: me('manager') }),
    'GET /darkrooms/harbour': () => ({ body: darkroom('manager') }),
    'GET /darkrooms/harbour/suppliers': () => ({ body: { suppliers: [] } }),
    'GET /darkrooms/harbour/orders/o-2': () => ({
      body: { order: shown, mailText: 'Please send' } satisfies OrderPageData,
    }),
    'PATCH /darkrooms/harbour/orders/o-2': () => {
      shown = {
        ...draft,
        revision: 2,
        totalMinor: 4_600,
        lines: draft.lines.map((line) => ({ ...line, count: 4 })),
      };
      return { body: { order: shown } };
    },
    'PUT /darkrooms/harbour/order-sendings/*': () => ({ body: { order: { ...shown, state: 'sent' } } }),
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
