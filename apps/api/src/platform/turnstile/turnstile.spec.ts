import { NoPlace, Turnstile } from './turnstile.js';

describe('the turnstile', () => {
  it('lets two through at once and keeps the order of the rest', async () => {
    const turnstile = new Turnstile(2);
    const open: (() => void)[] = [];
    const begun: number[] = [];
    let most = 0;
    let inside = 0;
    const all = Array.from({ length: 6 }, (_, i) =>
      turnstile.pass(async () => {
        begun.push(i);
        most = Math.max(most, (inside += 1));
        await new Promise<void>((go) => open.push(go));
        inside -= 1;
      }),
    );
    for (let done = 0; done < 6; done += 1) {
      while (open.length === 0) await Promise.resolve();
      open.shift()?.();
    }
    await Promise.all(all);
    expect(most).toBe(2);
    expect(begun).toEqual([0, 1, 2, 3, 4, 5]);
  });

  it('gives a place back when the work failed', async () => {
    const turnstile = new Turnstile(1);
    await expect(turnstile.pass(() => Promise.reject(new Error('spilt')))).rejects.toThrow('spilt');
    await expect(turnstile.pass(() => Promise.resolve('dry'))).resolves.toBe('dry');
  });

  it('turns away whom the line has no room for, at once, and who waited too long', async () => {
    const turnstile = new Turnstile(1, { length: 1, waitMs: 20 });
    const leave = await turnstile.enter();
    const waiting = turnstile.enter();
    await expect(turnstile.enter()).rejects.toThrow('The line is full.');
    await expect(waiting).rejects.toBeInstanceOf(NoPlace);
    leave();
    (await turnstile.enter())();
    await expect(turnstile.pass(() => Promise.resolve('dry'))).resolves.toBe('dry');
  });
});
