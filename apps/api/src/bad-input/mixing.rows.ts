import type { Row } from './table.js';
import type { World } from './world.js';

const LITRE = 1_000_000;
type Pack = 'concentrate' | 'kit' | 'powder';

/** So many packs as a lot of their own, and so much mixed from it, one after the other; the last is asked. */
const fromLot =
  (pack: Pack, count: number, ...volumes: number[]) =>
  async (w: World) => {
    const { lotId } = await w.house.receive(w.house[pack], count);
    const mix = (volumeUl: number) =>
      w.put(w.technician, 'mixes', w.mix({ volumeUl, from: { kind: 'lot', lotId } }));
    for (const volume of volumes.slice(0, -1)) await mix(volume).expect(201);
    return () => mix(volumes.at(-1) ?? 0);
  };

/** The rest of a concentrate that makes 5 L, opened for the first volume. */
const fromOpened =
  (first: number, ...volumes: number[]) =>
  async (w: World) => {
    const { lotId } = await w.house.receive(w.house.concentrate, 1);
    await w.put(w.technician, 'mixes', w.mix({ volumeUl: first, from: { kind: 'lot', lotId } })).expect(201);
    const [row] = await w.root<{ id: string }[]>`select id from opened_packs where lot_id = ${lotId}`;
    const from = { kind: 'opened', openedPackIds: [row?.id] };
    const mix = (volumeUl: number) => w.put(w.technician, 'mixes', w.mix({ volumeUl, from }));
    for (const volume of volumes.slice(0, -1)) await mix(volume).expect(201);
    return () => mix(volumes.at(-1) ?? 0);
  };

const mix = (w: World, change: Record<string, unknown>) => w.put(w.technician, 'mixes', w.mix(change));

const rows: Row[] = [
  ['all that a pack makes', fromLot('concentrate', 1, 5 * LITRE), 201],
  [
    'a microlitre more than a pack makes',
    fromLot('concentrate', 1, 5 * LITRE + 1),
    422,
    'more-than-pack-makes',
    undefined,
    'makes 5 L',
  ],
  [
    'more than a pack makes, though the lot has two',
    fromLot('concentrate', 2, 6 * LITRE),
    422,
    'more-than-pack-makes',
  ],
  ['the last pack of a lot', fromLot('concentrate', 2, LITRE, LITRE), 201],
  [
    'one pack more than the lot has',
    fromLot('concentrate', 1, LITRE, LITRE),
    422,
    'lot-empty',
    undefined,
    'receive it first',
  ],
  ['a powder packet whole', fromLot('powder', 1, LITRE), 201],
  [
    'a microlitre less than a whole packet',
    fromLot('powder', 1, LITRE - 1),
    422,
    'whole-only',
    undefined,
    'makes 1 L',
  ],
  ['a microlitre more than a whole packet', fromLot('powder', 1, LITRE + 1), 422, 'more-than-pack-makes'],
  ['all that is left of an opened pack', fromOpened(2 * LITRE, 3 * LITRE), 201],
  [
    'more than is left of an opened pack',
    fromOpened(2 * LITRE, 3 * LITRE + 100_000),
    422,
    'opened-too-little',
    undefined,
    'concentrate',
  ],
  ['from an opened pack that is empty', fromOpened(5 * LITRE, LITRE), 422, 'opened-too-little'],
  [
    'from half of a kit’s parts',
    async (w) => {
      const { lotId } = await w.house.receive(w.house.kit, 1);
      await mix(w, { from: { kind: 'lot', lotId } }).expect(201);
      const [row] = await w.root<{ id: string }[]>`select id from opened_packs where lot_id = ${lotId}`;
      return () => mix(w, { from: { kind: 'opened', openedPackIds: [row?.id] } });
    },
    400,
    'invalid',
    'content.from.openedPackIds',
    'for each part',
  ],
  ['from a lot that is not named', (w) => mix(w, { from: { kind: 'lot' } }), 400, 'invalid'],
  ['from an opened pack that is not named', (w) => mix(w, { from: { kind: 'opened' } }), 400, 'invalid'],
  [
    'from no opened pack',
    (w) => mix(w, { from: { kind: 'opened', openedPackIds: [] } }),
    400,
    'invalid',
    'content.from.openedPackIds',
  ],
  [
    'from a bottle of stock that is not named',
    (w) => mix(w, { from: { kind: 'stock' } }),
    400,
    'invalid',
    'content.from.bottleId',
  ],
  ['from nowhere', (w) => mix(w, { from: null }), 400, 'invalid', 'content.from'],
  [
    'from a place that is none',
    (w) => mix(w, { from: { kind: 'tap' } }),
    400,
    'invalid',
    'content.from.kind',
  ],
  ['from a list of places', (w) => mix(w, { from: [{ kind: 'hand' }] }), 400, 'invalid', 'content.from'],
  [
    'from a discarded bottle',
    (w) => mix(w, { from: { kind: 'stock', bottleId: w.ids.discardedId } }),
    422,
    'stock-closed',
  ],
  [
    'from a bottle that holds less',
    async (w) => {
      const bottleId = await w.bottle();
      return () => mix(w, { volumeUl: 900 * LITRE, from: { kind: 'stock', bottleId } });
    },
    422,
    'stock-too-little',
    undefined,
    'Mix less',
  ],
  ['as much as the container holds', (w) => mix(w, { container: { sizeUl: LITRE, kind: 'bottle' } }), 201],
  [
    'a microlitre more than the container holds',
    (w) => mix(w, { volumeUl: LITRE + 1, container: { sizeUl: LITRE, kind: 'bottle' } }),
    422,
    'volume-over-container',
    'content.container.sizeUl',
    'larger',
  ],
  [
    'into a container of no kind',
    (w) => mix(w, { container: { sizeUl: LITRE, kind: 'hat' } }),
    400,
    'invalid',
    'content.container.kind',
  ],
  ['into no container', (w) => mix(w, { container: null }), 400, 'invalid', 'content.container'],
  ['for a material that is none', (w) => mix(w, { material: 'cloth' }), 400, 'invalid', 'content.material'],
];

export const mixingRows = rows.map(([what, ...rest]): Row => [`mixing ${what}`, ...rest]);
