import { reorderAdvice } from './reorder.js';

describe('reordering', () => {
  it.each([
    [0, 0, true, 2],
    [1, 0, true, 1],
    [0, 1, true, 1],
    [2, 0, false, 0],
    [1, 1, false, 0],
    [0, 2, false, 0],
  ])('%d unopened and %d on order: due %s, %d', (unopened, onOrder, due, quantity) => {
    expect(reorderAdvice({ unopened, onOrder })).toMatchObject({ due, quantity });
  });

  it('after ordering what it advises nothing is due', () => {
    for (let unopened = 0; unopened < 8; unopened += 1) {
      const rule = { reorderPoint: 3, upTo: 6 };
      const { quantity } = reorderAdvice({ unopened, onOrder: 0, ...rule });
      expect(reorderAdvice({ unopened, onOrder: quantity, ...rule }).due).toBe(false);
    }
  });

  it('says why', () => {
    expect(reorderAdvice({ unopened: 0, onOrder: 1 }).reason).toBe(
      'None on the shelf and 1 on order: order at 1, keep 2',
    );
    expect(reorderAdvice({ unopened: 3, onOrder: 0 }).reason).toBe(
      '3 on the shelf: above the reorder point of 1',
    );
  });

  it('refuses counts that are none and a rule that never ends', () => {
    expect(() => reorderAdvice({ unopened: -1, onOrder: 0 })).toThrow(RangeError);
    expect(() => reorderAdvice({ unopened: 0.5, onOrder: 0 })).toThrow(RangeError);
    expect(() => reorderAdvice({ unopened: 0, onOrder: 0, reorderPoint: 2, upTo: 2 })).toThrow(RangeError);
  });
});
