/** Lets so many pieces of work run at once; the rest wait in line. */
export class Turnstile {
  private running = 0;
  private readonly waiting: (() => void)[] = [];

  constructor(private readonly width: number) {}

  async pass<T>(work: () => Promise<T>): Promise<T> {
    if (this.running >= this.width) await new Promise<void>((go) => this.waiting.push(go));
    else this.running += 1;
    try {
      return await work();
    } finally {
      // The place goes straight to the next in line, so that nobody slips in between.
      const next = this.waiting.shift();
      if (next) next();
      else this.running -= 1;
    }
  }
}
