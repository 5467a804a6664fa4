import { readEnvironment, type Mode } from '../../config/environment.js';
import { Clock } from './clock.js';

const nowhere = 'postgres://nobody@127.0.0.1:1/none';
function environment(mode: Mode, clockOffset: number) {
  const test = readEnvironment({ MODE: 'test', DATABASE_URL: nowhere, DATABASE_JOBS_URL: nowhere });
  return { ...test, mode, clockOffset };
}

describe('the clock', () => {
  it('runs ahead by its offset', () => {
    const day = 86_400_000;
    const ahead =
      new Clock(environment('demo', day)).now().getTime() - new Clock(environment('demo', 0)).now().getTime();
    expect(Math.abs(ahead - day)).toBeLessThan(1000);
  });

  it('is never moved in real use', () => {
    expect(() => new Clock(environment('real', 1))).toThrow('real use');
    expect(() => new Clock(environment('real', 0)).advance(1)).toThrow('real use');
  });
});
