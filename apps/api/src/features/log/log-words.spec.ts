import { filmWords, inTheOrderOfALine, volumeWords } from './log-words.js';

const film = (
  format: string,
  count: number,
  widthMm: number | null = null,
  heightMm: number | null = null,
) => ({
  format,
  count,
  widthMm,
  heightMm,
});

describe('the words of the log', () => {
  it.each([
    [film('135-36', 1), '1 roll of 135'],
    [film('135-24', 2), '2 rolls of 135, 24 frames'],
    [film('120', 3), '3 rolls of 120'],
    [film('4x5', 6), '6 sheets of 4×5'],
    [film('sheet', 1, 102, 127), '1 sheet of 102 × 127 mm'],
  ])('%j', (given, words) => {
    expect(filmWords(given)).toBe(words);
  });

  it.each([
    [1_000_000, '1 L'],
    [600_000, '600 mL'],
    [3_800_000, '3.8 L'],
    [18_750, '18.8 mL'],
  ])('%d µL is %s', (ul, words) => {
    expect(volumeWords(ul)).toBe(words);
  });

  it('a film meets its bottles in the order of a line, not of the alphabet', () => {
    const codes = ['FX-31', 'DV-14', 'WT-40', 'SB-22', 'WA-09'];
    expect(codes.sort(inTheOrderOfALine)).toEqual(['DV-14', 'SB-22', 'FX-31', 'WA-09', 'WT-40']);
  });
});
