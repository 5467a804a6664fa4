/** How the catcher treats the next mail; each mode is a way a real mail server can behave. */
export const behaviourModes = [
  'accept',
  'refuse',
  'hang',
  'drop-before-end',
  'drop-after-end',
  'slow',
] as const;

export type BehaviourMode = (typeof behaviourModes)[number];

export interface BehaviourOrder {
  mode: BehaviourMode;
  /** For how many mails; after them the mode is 'accept' again. Left out: until told otherwise. */
  times?: number;
}

export interface BehaviourCounters {
  /** Connections opened to the SMTP socket. */
  connections: number;
  /** Mails kept, whether or not the sender learnt of it. */
  accepted: number;
  /** Mails answered with 451. */
  refused: number;
  /** Connections cut in the middle of a mail. */
  dropped: number;
}

export interface BehaviourState extends BehaviourCounters {
  mode: BehaviourMode;
  /** Mails the mode still holds for; null when it has no end. */
  timesLeft: number | null;
}

/** The mode in force and what has happened so far. */
export class Behaviour {
  readonly counters: BehaviourCounters = { connections: 0, accepted: 0, refused: 0, dropped: 0 };
  private mode: BehaviourMode = 'accept';
  private timesLeft: number | null = null;

  set(order: BehaviourOrder): void {
    this.mode = order.mode;
    this.timesLeft = order.times ?? null;
  }

  /** The mode for one mail, counted against `times`. */
  take(): BehaviourMode {
    const mode = this.mode;
    if (this.timesLeft !== null && (this.timesLeft -= 1) <= 0) this.set({ mode: 'accept' });
    return mode;
  }

  state(): BehaviourState {
    return { mode: this.mode, timesLeft: this.timesLeft, ...this.counters };
  }
}

/** Reads an order from JSON of unknown shape; gives a sentence when it is not one. */
export function parseBehaviour(value: unknown): BehaviourOrder | string {
  if (typeof value !== 'object' || value === null) return 'Send an object with a mode.';
  const mode = behaviourModes.find((known) => 'mode' in value && known === value.mode);
  if (!mode) return `The mode is one of ${behaviourModes.join(', ')}.`;
  const times = 'times' in value ? value.times : undefined;
  if (times === undefined) return { mode };
  if (typeof times !== 'number' || !Number.isInteger(times) || times < 1) {
    return 'times is a whole number of 1 or more.';
  }
  return { mode, times };
}
