import { costShare, takenOf, wholePart } from './proportions.js';

const liquid = (sizeUl: number) => ({ packPartId: 'a', sizeUl, sizeMg: null });
const powder = (sizeMg: number) => ({ packPartId: 'b', sizeUl: null, sizeMg });

describe('what a mix takes of each part', () => {
  it('is in proportion, exact where it divides', () => {
    // One litre of a 1+4 concentrate makes 5 L, so 1 L of the bath takes 200 mL.
    expect(takenOf(liquid(1_000_000), 1_000_000, 5_000_000)).toEqual({ volumeUl: 200_000 });
    expect(takenOf(powder(90_000), 500_000, 1_000_000)).toEqual({ massMg: 45_000 });
  });

  it('is rounded up once where it does not divide', () => {
    expect(takenOf(liquid(1_000_000), 1_000_000, 3_000_000)).toEqual({ volumeUl: 333_334 });
    expect(takenOf(powder(10), 1, 3)).toEqual({ massMg: 4 });
  });

  it('is all of it for all that the pack makes', () => {
    const part = liquid(500_001);
    expect(takenOf(part, 3_000_000, 3_000_000)).toEqual(wholePart(part));
  });

  it('stays exact past 2^53', () => {
    // 1,000 L of concentrate for 1,000,000 L: the product is 10^21.
    expect(takenOf(liquid(1_000_000_000), 999_999_999_999, 1_000_000_000_000)).toEqual({
      volumeUl: 1_000_000_000,
    });
  });

  it('refuses a part without a size', () => {
    expect(() => wholePart({ packPartId: 'c', sizeUl: null, sizeMg: null })).toThrow(RangeError);
  });
});

describe('what a mix costs', () => {
  it('is the share of the pack, to the nearest minor unit', () => {
    expect(costShare(1150, 1_000_000, 5_000_000)).toBe(230);
    expect(costShare(1000, 1_000_000, 3_000_000)).toBe(333);
    expect(costShare(1000, 2_000_000, 3_000_000)).toBe(667);
  });

  it('rounds a half up', () => {
    expect(costShare(5, 1, 2)).toBe(3);
  });
});
