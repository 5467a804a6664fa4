import { isDone, numberText, openOf, totalMinor } from './order-lines.js';

describe('what of an order is still to come', () => {
  it('counts off what came and what was cancelled', () => {
    expect(openOf({ count: 5, received: 2, cancelled: 1 })).toBe(2);
  });

  it('stays at zero when more came than was asked', () => {
    expect(openOf({ count: 2, received: 3, cancelled: 0 })).toBe(0);
  });

  it('is done when every line is', () => {
    const came = { count: 2, received: 2, cancelled: 0 };
    expect(isDone([came, { count: 0, received: 0, cancelled: 0 }])).toBe(true);
    expect(isDone([came, { count: 1, received: 0, cancelled: 0 }])).toBe(false);
  });
});

describe('what an order comes to', () => {
  it('adds up the lines at the price of their day', () => {
    expect(
      totalMinor([
        { count: 2, priceMinor: 1150 },
        { count: 1, priceMinor: 6100 },
      ]),
    ).toBe(8400);
  });

  it('is not known when one price is not', () => {
    expect(
      totalMinor([
        { count: 2, priceMinor: 1150 },
        { count: 1, priceMinor: null },
      ]),
    ).toBeNull();
  });

  it('does not ask for the price of a line that was taken out', () => {
    expect(
      totalMinor([
        { count: 2, priceMinor: 1150 },
        { count: 0, priceMinor: null },
      ]),
    ).toBe(2300);
  });
});

it('writes a number with four digits at the least', () => {
  expect([numberText(7), numberText(12345)]).toEqual(['0007', '12345']);
});
