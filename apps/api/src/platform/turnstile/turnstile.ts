/** How long the line may grow, and how many milliseconds anybody stands in it. */
export interface Line {
  length: number;
  waitMs: number;
}

/** No place came free in time, or the line was full already; the work was not begun. */
export class NoPlace extends Error {
  override readonly name = 'NoPlace';
}

/** Lets so many pieces of work run at once; the rest wait in line. */
export class Turnstile {
  private running = 0;
  private readonly waiting = new Set<() => void>();

  /** @param line left out: without end, and for as long as it takes */
  constructor(
    private readonly width: number,
    private readonly line: Line | null = null,
  ) {}

  /** @throws NoPlace */
  async pass<T>(work: () => Promise<T>): Promise<T> {
    const leave = await this.enter();
    try {
      return await work();
    } finally {
      leave();
    }
  }

  /**
   * Takes a place, to be given back by calling what it answers, once.
   * @throws NoPlace
   */
  async enter(): Promise<() => void> {
    if (this.running >= this.width) await this.wait();
    else this.running += 1;
    return () => this.leave();
  }

  private leave(): void {
    // The place goes straight to the next in line, so that nobody slips in between.
    const [next] = this.waiting;
    if (next) next();
    else this.running -= 1;
  }

  private wait(): Promise<void> {
    const { line } = this;
    if (line && this.waiting.size >= line.length) return Promise.reject(new NoPlace('The line is full.'));
    return new Promise((resolve, reject) => {
      const go = (): void => {
        clearTimeout(timer);
        this.waiting.delete(go);
        resolve();
      };
      const giveUp = (): void => {
        this.waiting.delete(go);
        reject(new NoPlace('No place came free in time.'));
      };
      const timer = line ? setTimeout(giveUp, line.waitMs) : undefined;
      this.waiting.add(go);
    });
  }
}
