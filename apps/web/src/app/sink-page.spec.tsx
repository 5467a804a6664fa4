import { rememberedChoice } from '../features/loads/remembered-choice.js';
import { screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { BottleList, BottleView, LoadContent } from '../shared/api/types.js';
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
import { says } from '../testing/says.js';

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
/** The fixer's own row: the stop bath beside it has rolls left too. */
const fixerWith = (rolls: number) =>
  screen.findByRole('button', { name: new RegExp(`^FX-01, .*: ${rolls} rolls left`) });
/** A server that knows how many rolls the fixer has seen, so that fetching again agrees with its answers. */
function fixerAtServer(rolls: number) {
  const server = {
    list: bottleList([{ code: 'FX-01', document: fixer, rolls }]),
    put: (now: number, actionId = 'load'): BottleView => {
      const after = bottle({ code: 'FX-01', document: fixer, rolls: now });
      const view = { ...after, totals: { ...after.totals, lastActionId: actionId } };
      server.list = { ...server.list, bottles: [view] };
      return view;
    },
  };
  return server;
}
const row = (code: string) => screen.getByRole('button', { name: new RegExp(`^${code}, `) });

afterEach(() => vi.useRealTimers());

describe('the sink', () => {
  it('lists the bottles in the order film meets them, each with its sentence', async () => {
    sinkWith(bottleList(three));
    renderAt('/d/harbour/sink');
    await fixerWith(13);
    const codes = within(screen.getByRole('list', { name: 'Bottles in use' }))
      .getAllByText(/^[A-Z]{2}-\d\d$/)
      .map((one) => one.textContent);
    expect(codes).toEqual(['SB-02', 'FX-01', 'WT-03']);
    expect(screen.getByText(says('13 rolls more. FX-01 gives out first.'))).toBeVisible();
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
    expect(await fixerWith(13)).toBeVisible();
  });

  it('says so when nothing stands there', async () => {
    sinkWith({ bottles: [], versions: {}, today: '2026-12-01' });
    renderAt('/d/harbour/sink');
    expect(await screen.findByText('Nothing stands at the sink yet.')).toBeVisible();
    expect(screen.queryByRole('link', { name: 'Record a mix' })).not.toBeInTheDocument();
  });

  it('puts a load through all bottles in two taps, and shows it before the answer', async () => {
    const answer = held<{ body: unknown }>();
    let list = bottleList(three);
    const api = sinkWith(list, () => answer.promise, {
      'GET /darkrooms/harbour/bottles?state=in-use': () => ({ body: list }),
    });
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: 'Put 1 roll through 3 bottles' }));

    expect(await fixerWith(12)).toBeInTheDocument();
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
    const told = bottle({ code: 'FX-01', document: fixer, rolls: 10 });
    list = { ...list, bottles: list.bottles.map((one) => (one.id === told.id ? told : one)) };
    answer.release({ body: loadAnswer('x', [told]) });
    expect(await fixerWith(10)).toBeInTheDocument();
  });

  it('takes the change back with the server’s sentence when that says no', async () => {
    const answer = held<{ status: number; body: unknown }>();
    sinkWith(bottleList(three), () => answer.promise);
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    expect(await fixerWith(12)).toBeInTheDocument();
    answer.release({ status: 422, body: { code: 'too-early', detail: 'FX-01 was not mixed then.' } });
    expect(await fixerWith(13)).toBeInTheDocument();
    expect(screen.getByText(says('FX-01 was not mixed then.'))).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Undo' })).not.toBeInTheDocument();
  });

  it('sends the same id and content again when nobody answered', async () => {
    const server = fixerAtServer(7);
    let tries = 0;
    const api = sinkWith(
      server.list,
      () => {
        tries += 1;
        return tries === 1 ? 'no signal' : { body: loadAnswer('x', [server.put(8)]) };
      },
      { 'GET /darkrooms/harbour/bottles?state=in-use': () => ({ body: server.list }) },
    );
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    expect(await fixerWith(12)).toBeInTheDocument();
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(2));
    const [first, second] = api.sent('PUT');
    expect(second?.path).toBe(first?.path);
    expect(contentOf(second?.body)).toEqual(contentOf(first?.body));
    expect(await fixerWith(12)).toBeInTheDocument();
  });

  it('undoes at once, by a void that names the load', async () => {
    const server = fixerAtServer(7);
    const voided = held<{ body: unknown }>();
    const api = sinkWith(
      server.list,
      ({ path }) => ({ body: loadAnswer('x', [server.put(8, path.split('/').at(-1))]) }),
      {
        'GET /darkrooms/harbour/bottles?state=in-use': () => ({ body: server.list }),
        'PUT /darkrooms/harbour/voids/*': () => voided.promise,
      },
    );
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    expect(await fixerWith(12)).toBeInTheDocument();
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    // The void is still on its way, and the roll is back.
    expect(await fixerWith(13)).toBeInTheDocument();
    expect(screen.getByText('Undone: 1 roll of 135.')).toBeInTheDocument();
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(2));
    const [load, undo] = api.sent('PUT');
    expect(undo?.body).toMatchObject({ content: { voidedActionId: load?.path.split('/').at(-1) } });
  });

  it('opens nothing by the second tap of a double tap, and opens again a moment later', async () => {
    vi.useFakeTimers({ toFake: ['Date'] });
    const api = sinkWith(bottleList(three), () => ({ body: loadAnswer('x', []) }));
    const { user } = renderAt('/d/harbour/sink');
    const foot = await screen.findByRole('button', { name: 'Put a load through' });
    await user.click(foot);
    await user.dblClick(await screen.findByRole('button', { name: /^Put 1 roll/ }));
    await waitFor(() => expect(screen.queryByRole('radio')).not.toBeInTheDocument());
    vi.advanceTimersByTime(799);
    await user.click(foot);
    expect(screen.queryByRole('radio')).not.toBeInTheDocument();
    vi.advanceTimersByTime(1);
    await user.click(foot);
    expect(await screen.findByRole('radio', { name: '135' })).toBeInTheDocument();
    expect(api.sent('PUT')).toHaveLength(1);
  });
});

describe('the load sheet', () => {
  it('says over-use before, and names it on the button', async () => {
    sinkWith(bottleList([{ code: 'FX-01', document: fixer, rolls: 14 }]));
    const { user } = renderAt('/d/harbour/sink');
    await fixerWith(6);
    await user.click(row('FX-01'));
    await user.type(await screen.findByRole('textbox', { name: 'How many' }), '8');
    expect(await screen.findByText(says('FX-01 has 6 rolls left, this is 8: 2 over'))).toBeVisible();
    expect(screen.getByRole('button', { name: 'Put 8 through, 2 over' })).toBeVisible();
  });

  it('says what it leaves, and leaves a bottle out by its tape', async () => {
    sinkWith(bottleList(three));
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: 'One more' }));
    expect(screen.getByText(says('Leaves 10 rolls in SB-02.'))).toBeVisible();
    await user.click(screen.getByRole('button', { name: /^SB-02 / }));
    expect(screen.getByText(says('Leaves 11 rolls in FX-01.'))).toBeVisible();
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
    expect(await screen.findByText(says('FX-01: On hold by Tomas: cloudy.'))).toBeVisible();
    expect(screen.queryByRole('button', { name: /^(Put|Report) \d/ })).not.toBeInTheDocument();
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
    expect(screen.getByText(says(/^SB-02 is left out. Spent: 12 of 12 rolls used/))).toBeVisible();
  });

  it('takes a sheet of any size once both its sides are said', async () => {
    const api = sinkWith(bottleList([{ code: 'FX-01', document: fixer }]), () => ({
      body: loadAnswer('x', []),
    }));
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await user.click(await screen.findByRole('button', { name: 'More: Format' }));
    await user.click(screen.getByRole('radio', { name: 'Other sheet' }));
    expect(screen.getByText('Say its width and height.')).toBeVisible();
    expect(screen.queryByRole('button', { name: /^Put 1/ })).not.toBeInTheDocument();
    await user.type(screen.getByRole('textbox', { name: 'Width' }), '199.4');
    await user.type(screen.getByRole('textbox', { name: 'Height' }), '254');
    // 200 × 254 mm is 508 cm² of a roll's 516.128 (8 in × 10 in by 1 in = 2.54 cm), and is rounded up: arithmetic.
    expect(screen.getByText('1 sheet = 1 roll')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Put 1 sheet through FX-01' }));
    await waitFor(() => expect(api.sent('PUT')).toHaveLength(1));
    expect(contentOf(api.sent('PUT')[0]?.body).film).toEqual([
      { format: 'sheet', widthMm: 200, heightMm: 254, count: 1, filmClass: 'conventional' },
    ]);
  });

  it('remembers format and film for the next load', async () => {
    sinkWith(bottleList(three), () => ({ body: loadAnswer('x', []) }));
    const first = renderAt('/d/harbour/sink');
    await first.user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    await first.user.click(await screen.findByRole('radio', { name: '120' }));
    await first.user.click(screen.getByRole('radio', { name: 'Tabular' }));
    await first.user.click(screen.getByRole('button', { name: /^Put 1 roll/ }));
    await waitFor(() => expect(screen.queryByRole('radio')).not.toBeInTheDocument());
    expect(rememberedChoice('m-1')).toEqual({ format: '120', filmClass: 'tabular-grain', count: 1 });
  });

  it('never takes what was typed for another number', async () => {
    sinkWith(bottleList([{ code: 'FX-01', document: fixer }]));
    const { user } = renderAt('/d/harbour/sink');
    await user.click(await screen.findByRole('button', { name: 'Put a load through' }));
    const field = await screen.findByRole('textbox', { name: 'How many' });
    for (const wrong of ['1.5', '-3', '0', '115', '10000', 'abc']) {
      await user.clear(field);
      await user.type(field, wrong);
      expect(screen.getByText('Whole rolls, 1 to 99.')).toBeVisible();
      expect(screen.queryByRole('button', { name: /^Put \d/ })).not.toBeInTheDocument();
    }
    await user.clear(field);
    await user.type(field, '12');
    expect(screen.getByRole('button', { name: 'Put 12 rolls through FX-01' })).toBeVisible();
  });
});
