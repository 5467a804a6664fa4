import type { StepFlag } from '@wetside/chemistry';
import { flagsToDecide, loadSubject, packSubject } from './conditions.js';

const pack = (unopened: number, onOrder: number, reorderPoint: number | null) =>
  packSubject({ id: 'p', name: 'Rapid fixer', unopened, onOrder, reorderPoint }).holds;

const load = (flags: StepFlag[], some: { voided?: boolean; decided?: boolean } = {}) =>
  loadSubject({
    id: 'l',
    by: 'Marek',
    happenedOn: '2026-03-01',
    voided: false,
    decided: false,
    steps: [
      { code: 'DV-01', flags: [] },
      { code: 'SB-20', flags },
    ],
    film: [],
    ...some,
  }).holds;

describe('what holds about a pack', () => {
  it.each([
    [2, 0, 1, []],
    [1, 0, 1, ['reorder-point']],
    [1, 1, 1, []],
    [0, 0, 1, ['none-on-shelf', 'reorder-point']],
    [0, 2, 1, ['none-on-shelf']],
    [0, 0, 0, ['none-on-shelf', 'reorder-point']],
  ])('%i on the shelf, %i on order, reorder point %i', (unopened, onOrder, point, holds) => {
    expect(pack(unopened, onOrder, point)).toEqual(holds);
  });

  it('is nothing where the house does not watch it', () => {
    expect(pack(0, 0, null)).toEqual([]);
  });
});

describe('what holds about a load', () => {
  it.each<StepFlag>(['past_date', 'on_hold', 'after_discard', 'incompatible', 'wrong_material'])(
    '%s is to be decided',
    (flag) => {
      expect(load([flag])).toEqual(['load-to-decide']);
    },
  );

  it.each<StepFlag>(['over_capacity', 'volume_short'])('%s is not', (flag) => {
    expect(load([flag])).toEqual([]);
    expect(flagsToDecide([flag])).toEqual([]);
  });

  it('is nothing once it is voided or accepted', () => {
    expect(load(['past_date'], { voided: true })).toEqual([]);
    expect(load(['past_date'], { decided: true })).toEqual([]);
  });
});
