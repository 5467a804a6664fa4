import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { BottleList, LoadContent } from '../shared/api/types.js';
import { fakeApi, type Handler, held } from '../testing/fake-api.js';
import {
  bottle,
  bottleList,
  type BottleSketch,
  darkroom,
  fixer,
  loadAnswer,
  me,
  stopBath,
  wettingAgent,
} from '../testing/fixtures.js';
import { renderAt } from '../testing/render-at.js';

const three: BottleSketch[] = [
  { code: 'WT-03', document: wettingAgent },
  { code: 'FX-01', document: fixer, rolls: 7 },
  { code: 'SB-02', document: stopBath },
];

function sinkWith(list: BottleList, loads?: Handler, more: Record<string, Handler> = {}) {
  return fakeApi({
    'GET /me': () => ({ body: me() }),
    'GET /darkrooms/harbour': () => ({ body: darkroom() }),
    'GET /darkrooms/harbour/bottles?state=in-use': () => ({ body: list }),
    ...(loads && { 'PUT /darkrooms/harbour/loads/*': loads }),
    ...more,
  });
}
const contentOf = (body: unknown): LoadContent => (body as { content: LoadContent }).content;
const row = (code: string) => screen.getByRole('button', { name: new RegExp(`^${code}, `) });

describe('the sink', () => {
  it('lists the bottles in the order film meets them, each with its sentence', async () => {
    sinkWith(bottleList(three));
    renderAt('/d/harbour/sink');
    await screen.findByText(/^13 rolls left/);
    const codes = within(screen.getByRole('list', { name: 'Bottles in use' }))
      .getAllByText(/^[A-Z]{2}-\d\d$/)
      .map((one) => one.textContent);
    expect(codes).toEqual(['SB-02', 'FX-01', 'WT-03']);
    expect(screen.getByText('13 rolls more. FX-01 gives out first.')).toBeVisible();
  });

  it('says so when it cannot be fetched, and tries again', async () => {
    let works = false;
    sinkWith(bottleList(three), undefined, {
      'GET /darkrooms/harbour/bottles?state=in-use': () =>
        works
          ? { body: bottleList(three) }
          : { status: 500, body: { code: 'broken', detail: 'Something broke.' } },
    });
    const { user } = renderAt('/d/harbour/sink');
    expect(await screen.findByText(/The sink could not be fetched\./)).toBeVisible();
    works = true;
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText(/^13 rolls left/)).toBeVisible();
  });

  it('says so when nothing stands there', async () => {
    sinkWith({ bottles: [], versions: {}, today: '2026-12-01' });
    renderAt('/d/harbour/sink');
    expect(await screen.findByText('Nothing stands at the sink yet.')).toBeVisible();
    expect(screen.queryByRole('link', { name: 'Record a mix' })).not.toBeInTheDocument();
  });

  it('puts a load through all bottles in two taps, and shows it before the answer', async () => {
    const answer = held<{ body: unknown }>();
    const api = sinkWith(bottleList(three), () => answer.promise);
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: 'Put 1 roll through 3 bottles' }));

    expect(await screen.findByText(/^12 rolls left/)).toBeInTheDocument();
    expect(screen.getByRole('status', { name: 'What was just done' })).toHaveTextContent(
      '1 roll of 135 is in.',
    );
    const [sent] = api.sent('PUT');
    expect(contentOf(sent?.body)).toMatchObject({
      v: 1,
      bottleIds: ['b-SB-02', 'b-FX-01', 'b-WT-03'],
      film: [{ format: '135-36', count: 1, filmClass: 'conventional' }],
    });

    // The server knows of another load besides: its answer takes the place of what was reckoned here.
    answer.release({ body: loadAnswer('x', [bottle({ code: 'FX-01', document: fixer, rolls: 10 })]) });
    expect(await screen.findByText(/^10 rolls left/)).toBeInTheDocument();
  });

  it('takes the change back with the server’s sentence when that says no', async () => {
    const answer = held<{ status: number; body: unknown }>();
    sinkWith(bottleList(three), () => answer.promise);
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    expect(await screen.findByText(/^12 rolls left/)).toBeInTheDocument();
    answer.release({ status: 422, body: { code: 'too-early', detail: 'FX-01 was not mixed then.' } });
    expect(await screen.findByText(/^13 rolls left/)).toBeInTheDocument();
    expect(screen.getByText('FX-01 was not mixed then.')).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Undo' })).not.toBeInTheDocument();
  });

  it('sends the same id and content again when nobody answered', async () => {
    let tries = 0;
    const api = sinkWith(bottleList(three), () => {
      tries += 1;
      if (tries === 1) return 'no signal';
      return { body: loadAnswer('x', [bottle({ code: 'FX-01', document: fixer, rolls: 8 })]) };
    });
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(2), { timeout: 4_000 });
    const [first, second] = api.sent('PUT');
    expect(second?.path).toBe(first?.path);
    expect(contentOf(second?.body)).toEqual(contentOf(first?.body));
    expect(screen.getByText(/^12 rolls left/)).toBeInTheDocument();
  });

  it('undoes at once, by a void that names the load', async () => {
    const voided = held<{ body: unknown }>();
    const api = sinkWith(
      bottleList(three),
      ({ path }) => {
        const id = path.split('/').at(-1) ?? '';
        const after = bottle({ code: 'FX-01', document: fixer, rolls: 8 });
        return { body: loadAnswer(id, [{ ...after, totals: { ...after.totals, lastActionId: id } }]) };
      },
      { 'PUT /darkrooms/harbour/voids/*': () => voided.promise },
    );
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    await screen.findByText(/^12 rolls left/);
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    // The void is still on its way, and the roll is back.
    expect(await screen.findByText(/^13 rolls left/)).toBeInTheDocument();
    expect(screen.getByText('Undone: 1 roll of 135.')).toBeInTheDocument();
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(2));
    const [load, undo] = api.sent('PUT');
    expect(undo?.body).toMatchObject({ content: { voidedActionId: load?.path.split('/').at(-1) } });
  });

  it('opens nothing by the second tap of a double tap', async () => {
    const api = sinkWith(bottleList(three), () => ({ body: loadAnswer('x', []) }));
    const { user } = renderAt('/d/harbour/sink');
    const foot = await screen.findByRole('button', { name: 'Put a load through' });
    await user.click(foot);
    await user.dblClick(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    await user.click(foot);
    expect(screen.queryByRole('dialog', { name: 'Put a load through' })).not.toBeInTheDocument();
    expect(api.sent('PUT')).toHaveLength(1);
  });
});

describe('the load sheet', () => {
  it('says over-use before, and names it on the button', async () => {
    sinkWith(bottleList([{ code: 'FX-01', document: fixer, rolls: 14 }]));
    const { user } = renderAt('/d/harbour/sink');
    await screen.findByText(/^6 rolls left/);
    await user.click(row('FX-01'));
    await user.type(await screen.findByRole('textbox', { name: 'How many' }), '8');
    expect(await screen.findByText('FX-01 has 6 rolls left, this is 8: 2 over')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Put 8 through, 2 over' })).toBeVisible();
  });

  it('says what it leaves, and leaves a bottle out by its tape', async () => {
    sinkWith(bottleList(three));
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: 'One more' }));
    expect(screen.getByText('Leaves 10 rolls in SB-02.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: /^SB-02 / }));
    expect(screen.getByText('Leaves 11 rolls in FX-01.')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Put 2 rolls through 2 bottles' })).toBeVisible();
  });

  it('has no button while the only fixer is on hold, and takes a load that has happened', async () => {
    const api = sinkWith(
      bottleList([
        { code: 'FX-01', document: fixer, hold: 'cloudy' },
        { code: 'SB-02', document: stopBath },
      ]),
      () => ({ body: loadAnswer('x', []) }),
    );
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    expect(await screen.findByText('FX-01: On hold by Tomas: cloudy.')).toBeVisible();
    expect(screen.queryByRole('button', { name: /^Put .* through/ })).not.toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'It has been through FX-01 already' }));
    await user.click(screen.getByRole('button', { name: 'Report 1 roll through 2 bottles' }));
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(1));
    expect(contentOf(api.sent('PUT')[0]?.body)).toMatchObject({
      reported: true,
      bottleIds: ['b-SB-02', 'b-FX-01'],
    });
  });

  it('leaves a spent stop bath out by itself and says so on the button', async () => {
    sinkWith(
      bottleList([
        { code: 'FX-01', document: fixer },
        { code: 'SB-02', document: stopBath, rolls: 12 },
      ]),
    );
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    expect(await screen.findByRole('button', { name: 'Put 1 roll through FX-01' })).toBeVisible();
    expect(screen.getByText(/^SB-02: Spent: 12 of 12 rolls used/)).toBeVisible();
  });

  it('remembers format and film for the next load', async () => {
    sinkWith(bottleList(three), () => ({ body: loadAnswer('x', []) }));
    const first = renderAt('/d/harbour/sink');
    await first.user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await first.user.click(await screen.findByRole('radio', { name: '120' }));
    await first.user.click(screen.getByRole('radio', { name: 'Tabular' }));
    await first.user.click(screen.getByRole('button', { name: /^Put 1 roll/ }));
    await waitFor(() => expect(screen.queryByRole('radio')).not.toBeInTheDocument());
    expect(JSON.parse(localStorage.getItem('wetside.load.m-1') ?? '')).toEqual({
      format: '120',
      filmClass: 'tabular-grain',
    });
  });
});
