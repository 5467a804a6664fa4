import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { DarkroomMember } from '../shared/api/types.js';
import { fakeApi, type Handler } from '../testing/fake-api.js';
import { bottleList, darkroom, fixer, me } from '../testing/fixtures.js';
import { renderAt } from '../testing/render-at.js';

const signedOut: Handler = () => ({ status: 401, body: { code: 'signed-out', detail: 'Sign in to go on.' } });
const inside: Record<string, Handler> = {
  'GET /darkrooms/harbour': () => ({ body: darkroom() }),
  'GET /darkrooms/harbour/bottles?state=in-use': () => ({
    body: bottleList([{ code: 'FX-01', document: fixer }]),
  }),
};

describe('signing in', () => {
  it('asks for what is missing at its field, without a request', async () => {
    const api = fakeApi({ 'GET /me': signedOut });
    const { user } = renderAt('/sign-in');
    await user.click(await screen.findByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText('Your e-mail address.')).toBeVisible();
    expect(screen.getByRole('textbox', { name: 'E-mail address' })).toHaveFocus();
    expect(screen.getByLabelText('Passphrase')).toHaveAccessibleDescription('Your passphrase.');
    expect(api.asked.some(({ path }) => path === '/sign-in')).toBe(false);
  });

  it('says the server’s sentence and keeps what was typed', async () => {
    fakeApi({
      'GET /me': signedOut,
      'POST /sign-in': () => ({
        status: 401,
        body: { code: 'sign-in-refused', detail: 'That address and passphrase do not go together.' },
      }),
    });
    const { user } = renderAt('/sign-in');
    await user.type(await screen.findByRole('textbox', { name: 'E-mail address' }), 'ines@example.org');
    await user.type(screen.getByLabelText('Passphrase'), 'wrong and long enough{Enter}');
    expect(await screen.findByText('That address and passphrase do not go together.')).toBeVisible();
    expect(screen.getByRole('textbox', { name: 'E-mail address' })).toHaveValue('ines@example.org');
  });

  it('puts a field’s own objection at the field', async () => {
    fakeApi({
      'GET /me': signedOut,
      'POST /sign-in': () => ({
        status: 400,
        body: {
          code: 'invalid',
          detail: 'Look at the fields named here.',
          errors: [{ field: 'email', message: 'That is no e-mail address.' }],
        },
      }),
    });
    const { user } = renderAt('/sign-in');
    await user.type(await screen.findByRole('textbox', { name: 'E-mail address' }), 'ines');
    await user.type(screen.getByLabelText('Passphrase'), 'anything{Enter}');
    const email = screen.getByRole('textbox', { name: 'E-mail address' });
    await waitFor(() => expect(email).toHaveAccessibleDescription('That is no e-mail address.'));
    expect(email).toBeInvalid();
    expect(email).toHaveFocus();
  });

  it('goes to where the person wanted to be', async () => {
    fakeApi({ 'GET /me': signedOut, 'POST /sign-in': () => ({ body: me() }), ...inside });
    const { user, router } = renderAt('/d/harbour/sink');
    await user.type(await screen.findByRole('textbox', { name: 'E-mail address' }), 'ines@example.org');
    await user.type(screen.getByLabelText('Passphrase'), 'a long enough phrase{Enter}');
    expect(await screen.findByText(/^20 rolls left/)).toBeVisible();
    expect(router.state.location.pathname).toBe('/d/harbour/sink');
  });

  it('renews a session that ran out, once, and goes on', async () => {
    let renewed = false;
    const api = fakeApi({
      'GET /me': () =>
        renewed ? { body: me() } : signedOut({ method: 'GET', path: '/me', body: undefined }),
      'POST /sign-in/refresh': () => {
        renewed = true;
        return { status: 204 };
      },
      ...inside,
    });
    renderAt('/d/harbour/sink');
    expect(await screen.findByText(/^20 rolls left/)).toBeVisible();
    expect(api.asked.filter(({ path }) => path === '/sign-in/refresh')).toHaveLength(1);
  });
});

describe('what a role may not do, and what is not there', () => {
  it('says whom to ask', async () => {
    const joinedAt = '2026-01-01T00:00:00Z';
    fakeApi({
      'GET /me': () => ({ body: me() }),
      ...inside,
      'GET /darkrooms/harbour/people': () => ({
        body: [
          { membershipId: 'm-1', displayName: 'Ines', role: 'member', joinedAt },
          { membershipId: 'm-2', displayName: 'Tomas', role: 'technician', joinedAt },
          { membershipId: 'm-3', displayName: 'Ada', role: 'manager', joinedAt },
        ] satisfies DarkroomMember[],
      }),
    });
    renderAt('/d/harbour/mixing/new');
    expect(await screen.findByRole('heading', { name: 'Mixing is for technicians.' })).toBeVisible();
    expect(await screen.findByText('Ask Tomas or Ada.')).toBeVisible();
    expect(screen.queryByRole('link', { name: 'Shelf' })).not.toBeInTheDocument();
  });

  it('has one page for a bottle that is not here', async () => {
    fakeApi({ 'GET /me': () => ({ body: me() }), ...inside });
    renderAt('/d/harbour/bottles/FX-99');
    expect(await screen.findByRole('heading', { name: 'There is no such bottle here.' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'To the sink' })).toHaveAttribute('href', '/d/harbour/sink');
  });
});
