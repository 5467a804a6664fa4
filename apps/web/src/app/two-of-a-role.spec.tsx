import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { LoadContent } from '../shared/api/types.js';
import { fakeApi } from '../testing/fake-api.js';
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

/** FX-02 was mixed before FX-03 and has 6 of its 20 rolls left; the stop bath has 12. */
const older: BottleSketch = { code: 'FX-02', document: fixer, rolls: 14, daysOld: 9 };
const newer: BottleSketch = { code: 'FX-03', document: fixer, daysOld: 2 };
const stop: BottleSketch = { code: 'SB-01', document: stopBath };

function sinkOf(sketches: readonly BottleSketch[]) {
  const api = fakeApi({
    'GET /me': () => ({ body: me() }),
    'GET /darkrooms/harbour': () => ({ body: darkroom() }),
    'GET /darkrooms/harbour/bottles?state=in-use': () => ({ body: bottleList(sketches) }),
    'PUT /darkrooms/harbour/loads/*': () => ({ body: loadAnswer('x', []) }),
  });
  const sentBottles = async (): Promise<string[]> => {
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(1));
    return (api.sent('PUT')[0]?.body as { content: LoadContent }).content.bottleIds;
  };
  return { ...renderAt('/d/harbour/sink'), sentBottles };
}
const chip = (code: string) => screen.getByRole('button', { name: new RegExp(`^${code} `) });
const openSheet = async ({ user }: ReturnType<typeof sinkOf>): Promise<void> => {
  await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
  await screen.findByRole('group', { name: 'Through' });
};
const howMany = () => screen.getByRole('textbox', { name: 'How many' });

describe('two open bottles of one role', () => {
  it('puts a load through the one that was mixed first, whatever their codes', async () => {
    const sink = sinkOf([{ ...newer, code: 'FX-01' }, older, stop]);
    await openSheet(sink);
    expect(chip('FX-02')).toHaveAttribute('aria-pressed', 'true');
    expect(chip('FX-01')).toHaveAttribute('aria-pressed', 'false');
    expect(screen.getByText(says('Leaves 5 rolls in FX-02.'))).toBeVisible();
    await sink.user.click(screen.getByRole('button', { name: 'Put 1 roll through 2 bottles' }));
    expect(await sink.sentBottles()).toEqual(['b-SB-01', 'b-FX-02']);
  });

  it('takes the other in by a tap, and the first of that role goes out', async () => {
    const sink = sinkOf([older, newer, stop]);
    await openSheet(sink);
    await sink.user.click(chip('FX-03'));
    expect(chip('FX-03')).toHaveAttribute('aria-pressed', 'true');
    expect(chip('FX-02')).toHaveAttribute('aria-pressed', 'false');
    expect(chip('SB-01')).toHaveAttribute('aria-pressed', 'true');
    await sink.user.click(screen.getByRole('button', { name: 'Put 1 roll through 2 bottles' }));
    expect(await sink.sentBottles()).toEqual(['b-SB-01', 'b-FX-03']);
  });

  it('passes over the first when it does not hold the load, and says so', async () => {
    const sink = sinkOf([older, newer]);
    await openSheet(sink);
    await sink.user.type(howMany(), '6');
    expect(chip('FX-02')).toHaveAttribute('aria-pressed', 'true');
    await sink.user.click(screen.getByRole('button', { name: 'One more' }));
    expect(chip('FX-03')).toHaveAttribute('aria-pressed', 'true');
    expect(screen.getByText(says('FX-02 has 6 rolls left: this load goes through FX-03.'))).toBeVisible();
    expect(screen.getByRole('button', { name: 'Put 7 rolls through FX-03' })).toBeVisible();
    await sink.user.click(chip('FX-02'));
    expect(screen.getByRole('button', { name: 'Put 7 through, 1 over' })).toBeVisible();
  });

  it('leaves a role out by a tap, and puts nothing in its place', async () => {
    const sink = sinkOf([older, newer, stop]);
    await openSheet(sink);
    await sink.user.click(chip('FX-02'));
    await sink.user.type(howMany(), '7');
    expect(chip('FX-02')).toHaveAttribute('aria-pressed', 'false');
    expect(chip('FX-03')).toHaveAttribute('aria-pressed', 'false');
    expect(screen.getByRole('button', { name: 'Put 7 rolls through SB-01' })).toBeVisible();
  });

  it('counts the one that would be used, and says which stands ready', async () => {
    sinkOf([older, newer, stop]);
    expect(await screen.findByText(says('6 rolls more. FX-02 gives out first. Then FX-03.'))).toBeVisible();
  });

  it('names no next bottle that has nothing left', async () => {
    sinkOf([older, { ...newer, rolls: 20 }, stop]);
    expect(await screen.findByText(says('6 rolls more. FX-02 gives out first.'))).toBeVisible();
  });

  it('uses the other while the first is on hold, and reports a load through that one instead', async () => {
    const sink = sinkOf([{ ...older, hold: 'cloudy' }, newer]);
    expect(await screen.findByText(says('20 rolls more. FX-03 gives out first.'))).toBeVisible();
    await openSheet(sink);
    expect(screen.getByRole('button', { name: 'Put 1 roll through FX-03' })).toBeVisible();
    await sink.user.click(screen.getByRole('button', { name: 'It has been through FX-02 already' }));
    expect(chip('FX-03')).toHaveAttribute('aria-pressed', 'false');
    await sink.user.click(screen.getByRole('button', { name: 'Report 1 roll through FX-02' }));
    expect(await sink.sentBottles()).toEqual(['b-FX-02']);
  });
});
