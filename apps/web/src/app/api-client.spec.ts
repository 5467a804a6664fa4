import { describe, expect, it, vi } from 'vitest';
import { answered, api } from '../shared/api/client.js';
import { NetworkError, ProblemError } from '../shared/api/problem.js';
import { reckonedNow } from '../shared/clock/web-clock.js';
import { fakeApi } from '../testing/fake-api.js';
import { actionView, bottle, fixer } from '../testing/fixtures.js';

const signedOut = { status: 401, body: { code: 'signed-out', detail: 'Sign in to go on.' } };
const hold = (actionId: string) =>
  answered(
    api.PUT('/darkrooms/{darkroomId}/holds/{actionId}', {
      params: { path: { darkroomId: 'harbour', actionId } },
      body: {
        content: { v: 1, happenedAt: reckonedNow(), bottleId: 'b-1', reason: 'cloudy' },
        envelope: { sentAt: reckonedNow(), deviceNow: reckonedNow(), queued: false },
      },
    }),
  );
const held = () => ({
  body: {
    action: actionView('h', 'hold'),
    bottle: bottle({ code: 'FX-01', document: fixer, hold: 'cloudy' }),
  },
});

describe('asking the API', () => {
  it('renews a session once for all that wait, and sends the same bodies again', async () => {
    let renewed = false;
    const network = fakeApi({
      'PUT /darkrooms/harbour/holds/*': () => (renewed ? held() : signedOut),
      'POST /sign-in/refresh': () => {
        renewed = true;
        return { status: 204 };
      },
    });
    const answers = await Promise.all([hold('a'), hold('b')]);
    expect(answers.map(({ bottle: { totals } }) => totals.hold?.reason)).toEqual(['cloudy', 'cloudy']);
    expect(network.sent('POST')).toHaveLength(1);
    const bodies = network
      .sent('PUT')
      .filter(({ path }) => path.endsWith('/a'))
      .map(({ body }) => body);
    expect(bodies).toHaveLength(2);
    expect(bodies[1]).toEqual(bodies[0]);
  });

  it('says no in the server’s words when the session is over', async () => {
    fakeApi({ 'PUT /darkrooms/harbour/holds/*': () => signedOut, 'POST /sign-in/refresh': () => signedOut });
    await expect(hold('a')).rejects.toEqual(new ProblemError(401, 'signed-out', 'Sign in to go on.'));
  });

  it('takes an answer that broke off for no answer: what was sent may have arrived', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response('{"action":', { status: 201 })));
    await expect(hold('a')).rejects.toBeInstanceOf(NetworkError);
  });

  it('gives words even to an answer that is no problem document', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response('<h1>Bad gateway</h1>', { status: 502 })));
    await expect(hold('a')).rejects.toMatchObject({ status: 502, code: 'unknown' });
  });
});
