import { matchOpened, planDraws } from './draw-plan.js';

const a = { packPartId: 'a', name: 'part A', sizeUl: 500_000, sizeMg: null };
const b = { packPartId: 'b', name: 'part B', sizeUl: null, sizeMg: 90_000 };
const makes = { volumeUl: 5_000_000, wholeOnly: false };
const opened = (id: string, packPartId: string, left: { ul?: number; mg?: number }) => ({
  id,
  packPartId,
  leftUl: left.ul ?? null,
  leftMg: left.mg ?? null,
});

describe('what a mix takes', () => {
  it('takes each part in proportion', () => {
    expect(planDraws([a, b], 1_000_000, makes).map(({ taken }) => taken)).toEqual([
      { volumeUl: 100_000 },
      { massMg: 18_000 },
    ]);
  });

  it('is at most what one pack makes', () => {
    expect(() => planDraws([a], 5_000_001, makes)).toThrow('One pack makes 5 L. Mix that or less.');
  });

  it('takes a powder packet whole', () => {
    const whole = { volumeUl: 1_000_000, wholeOnly: true };
    expect(() => planDraws([b], 500_000, whole)).toThrow('A powder packet is mixed whole: it makes 1 L.');
    expect(planDraws([b], 1_000_000, whole)).toEqual([{ part: b, taken: { massMg: 90_000 } }]);
  });
});

describe('which opened pack a part comes from', () => {
  const draws = planDraws([a, b], 1_000_000, makes);

  it('finds them whatever their order', () => {
    const matched = matchOpened(draws, [opened('2', 'b', { mg: 18_000 }), opened('1', 'a', { ul: 400_000 })]);
    expect(matched.map(({ from }) => from.id)).toEqual(['1', '2']);
  });

  it('refuses when one part is missing, or stands there twice', () => {
    const one = opened('1', 'a', { ul: 400_000 });
    expect(() => matchOpened(draws, [one])).toThrow();
    expect(() => matchOpened(draws, [one, opened('3', 'a', { ul: 400_000 })])).toThrow();
  });

  it('names the part of which too little is left', () => {
    const little = [opened('1', 'a', { ul: 400_000 }), opened('2', 'b', { mg: 17_999 })];
    expect(() => matchOpened(draws, little)).toThrow('There is not enough left of part B for that.');
  });
});
