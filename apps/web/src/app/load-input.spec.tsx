import { fireEvent, screen, waitFor } from '@testing-library/react';
import { beforeAll, expect, it } from 'vitest';
import { fakeApi, type Handler } from '../testing/fake-api.js';
import { hurryTries } from '../testing/failing.js';
import { bottleList, darkroom, fixer, loadAnswer, me } from '../testing/fixtures.js';
import { renderAt } from '../testing/render-at.js';

beforeAll(hurryTries);

async function sheetWith(loads: Handler) {
  const api = fakeApi({
    'GET /me': () => ({ body: me() }),
    'GET /darkrooms/harbour': () => ({ body: darkroom() }),
    'GET /darkrooms/harbour/bottles?state=in-use': () => ({
      body: bottleList([{ code: 'FX-01', document: fixer }]),
    }),
    'PUT /darkrooms/harbour/loads/*': loads,
  });
  const { user } = renderAt('/d/harbour/sink');
  await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
  return { api, user };
}

it('a busy server’s 503 leaves the load unsent: the same id and content go out until they are taken', async () => {
  let busy = true;
  const { api, user } = await sheetWith(() =>
    busy
      ? { status: 503, body: { code: 'busy', detail: 'The server has more to do just now than it can.' } }
      : { body: loadAnswer('x', []) },
  );
  await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
  const strip = screen.getByRole('status', { name: 'What was just done' });
  await waitFor(() => expect(strip).toHaveTextContent(/than it can\. Not sent yet: 1 roll of 135 is in\./));
  busy = false;
  await user.click(screen.getByRole('button', { name: 'Try again' }));
  await waitFor(() => expect(strip).not.toHaveTextContent(/Not sent yet/));
  const sent = api
    .sent('PUT')
    .map(({ path, body }) => ({ path, content: (body as { content: unknown }).content }));
  expect(sent.length).toBeGreaterThan(2);
  for (const one of sent) expect(one).toEqual(sent[0]);
});

it('a sheet’s side is a number of millimetres, and is complained of at its field', async () => {
  const { user } = await sheetWith(() => ({ body: loadAnswer('x', []) }));
  await user.click(await screen.findByRole('button', { name: 'More: Format' }));
  await user.click(screen.getByRole('radio', { name: 'Other sheet' }));
  const width = screen.getByLabelText('Width');
  fireEvent.change(screen.getByLabelText('Height'), { target: { value: '254' } });
  for (const wrong of ['0', '-4', 'wide', '2001', '10000', '1e3', '10,000', '1,250', '1.250']) {
    fireEvent.change(width, { target: { value: wrong } });
    await waitFor(() => expect(width).toHaveAccessibleDescription('A number of mm, 1 to 2000.'));
    expect(width).toBeInvalid();
    expect(width).toHaveValue(wrong);
    expect(screen.queryByText(/^Put 1/)).not.toBeInTheDocument();
  }
  fireEvent.change(width, { target: { value: '199,4' } });
  expect(await screen.findByText('1 sheet = 1 roll')).toBeInTheDocument();
  expect(width).not.toBeInvalid();
});
