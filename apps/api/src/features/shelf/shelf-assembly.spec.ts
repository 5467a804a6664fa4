import { assembleShelf, type ShelfRows } from './shelf-assembly.js';

const darkroomId = 'd';
const pack = (id: string, more: Partial<ShelfRows['packs'][number]> = {}) => ({
  darkroomId,
  id,
  name: `Pack ${id}`,
  form: 'concentrate' as const,
  keepsUnopenedMonths: 24,
  reorderPoint: 1,
  reorderUpTo: 2,
  archivedAt: null,
  ...more,
});
const part = (id: string, packId: string) => ({
  darkroomId,
  id,
  packId,
  position: 1,
  name: 'A',
  sizeUl: 1_000_000,
  sizeMg: null,
  keepsOpenedMonths: null,
});
const lot = (id: string, packId: string, unopened: number, expiresOn: string | null) => ({
  darkroomId,
  id,
  packId,
  lotNumber: id,
  expiresOn,
  expiryIsGuess: false,
  unopened,
});
const none: ShelfRows = {
  packs: [],
  parts: [],
  makes: [],
  lots: [],
  opened: [],
  sold: [],
  onOrder: new Map(),
};

it('counts a pack over its lots, with the first expiry and what is on order', () => {
  const [view] = assembleShelf({
    ...none,
    packs: [pack('fixer')],
    parts: [part('a', 'fixer')],
    lots: [
      lot('l1', 'fixer', 2, '2027-03-01'),
      lot('l2', 'fixer', 1, '2027-01-12'),
      lot('l3', 'fixer', 1, null),
    ],
    onOrder: new Map([['fixer', 2]]),
  });
  expect(view).toMatchObject({
    unopened: 4,
    onOrder: 2,
    firstExpiry: '2027-01-12',
    advice: { due: false, quantity: 0 },
  });
});

it('does not count an opened pack and advises to order', () => {
  const opened = {
    darkroomId,
    id: 'o',
    lotId: 'l1',
    packPartId: 'a',
    openedOn: '2026-11-02',
    leftUl: 200_000,
    leftMg: null,
    voidedAt: null,
  };
  const [view] = assembleShelf({
    ...none,
    packs: [pack('fixer')],
    parts: [part('a', 'fixer')],
    lots: [lot('l1', 'fixer', 0, '2027-03-01')],
    opened: [opened],
  });
  expect(view?.advice).toMatchObject({ due: true, quantity: 2 });
  expect(view?.lots[0]?.opened).toEqual([
    { id: 'o', partId: 'a', partName: 'A', openedOn: '2026-11-02', leftUl: 200_000, leftMg: null },
  ]);
});

it('gives no advice on a pack that the house does not watch', () => {
  const [view] = assembleShelf({
    ...none,
    packs: [pack('fixer', { reorderPoint: null, reorderUpTo: null })],
  });
  expect(view?.advice.due).toBe(false);
});

it('keeps one more than the reorder point where nobody said how many', () => {
  const [view] = assembleShelf({ ...none, packs: [pack('fixer', { reorderPoint: 3, reorderUpTo: null })] });
  expect(view?.advice).toMatchObject({ due: true, quantity: 4 });
});

it('shows a pack that was given up only while there is some of it', () => {
  const packs = [pack('old', { archivedAt: new Date('2026-01-01T00:00:00Z') })];
  expect(assembleShelf({ ...none, packs })).toEqual([]);
  expect(assembleShelf({ ...none, packs, lots: [lot('l1', 'old', 1, null)] })).toHaveLength(1);
});
