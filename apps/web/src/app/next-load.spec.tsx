import { screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { fakeApi, type Handler } from '../testing/fake-api.js';
import {
  bottleList,
  type BottleSketch,
  darkroom,
  fixer,
  loadAnswer,
  me,
  stopBath,
} from '../testing/fixtures.js';
import { renderAt } from '../testing/render-at.js';
import { says } from '../testing/says.js';

function sinkOf(sketches: BottleSketch[], more: Record<string, Handler> = {}) {
  fakeApi({
    'GET /me': () => ({ body: me() }),
    'GET /darkrooms/harbour': () => ({ body: darkroom() }),
    'GET /darkrooms/harbour/bottles?state=in-use': () => ({ body: bottleList(sketches) }),
    'PUT /darkrooms/harbour/loads/*': () => ({ body: loadAnswer('x', []) }),
    'PUT /darkrooms/harbour/voids/*': () => ({ body: { bottles: [] } }),
    ...more,
  });
  return renderAt('/d/harbour/sink').user;
}
const foot = () => screen.findByRole('button', { name: 'Put a load through' });
const spentStop: BottleSketch = { code: 'SB-02', document: stopBath, rolls: 12 };

afterEach(() => vi.useRealTimers());

describe('the next load', () => {
  it('of as many rolls is two taps, also when the last was undone', async () => {
    vi.useFakeTimers({ toFake: ['Date'] });
    const user = sinkOf([{ code: 'FX-01', document: fixer }]);
    await user.click(await foot());
    await user.click(await screen.findByRole('button', { name: 'One more' }));
    await user.click(screen.getByRole('button', { name: 'Put 2 rolls through FX-01' }));
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() => expect(screen.queryByRole('radio')).not.toBeInTheDocument());
    vi.advanceTimersByTime(1_000);
    await user.click(await foot());
    expect(await screen.findByRole('button', { name: 'Put 2 rolls through FX-01' })).toBeVisible();
  });
});

describe('a closed bath', () => {
  it('that is cheap to renew is named in the headline, which stays open', async () => {
    sinkOf([{ code: 'FX-01', document: fixer, rolls: 16 }, spentStop]);
    const words = '4 rolls more. FX-01 gives out first. Mix 1 L of stop bath first: SB-02 is spent.';
    expect(await screen.findByText(says(words))).toBeVisible();
  });

  it('is not asked for while another of its role can be used', async () => {
    sinkOf([{ code: 'FX-01', document: fixer, rolls: 16 }, spentStop, { code: 'SB-03', document: stopBath }]);
    expect(await screen.findByText(says('4 rolls more. FX-01 gives out first.'))).toBeVisible();
  });

  it('is named with its reason above the button of a report', async () => {
    const user = sinkOf([{ code: 'FX-01', document: fixer, hold: 'smells wrong' }]);
    await user.click(await foot());
    await user.click(await screen.findByRole('button', { name: 'It has been through FX-01 already' }));
    const why = screen.getByText(says('FX-01: On hold by Tomas: smells wrong.'));
    const button = screen.getByRole('button', { name: 'Report 1 roll through FX-01' });
    expect(why.compareDocumentPosition(button)).toBe(Node.DOCUMENT_POSITION_FOLLOWING);
  });
});
