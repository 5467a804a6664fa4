import { createStore } from '../store.js';

/** The one strip at the top of a page: what was just done, and the way back. */
export interface Strip {
  actionId: string;
  state: 'sending' | 'done' | 'refused' | 'unsent';
  /** A whole sentence: '2 rolls of 135 are in.' */
  words: string;
  canUndo: boolean;
  /** What is said once it is undone: 'Undone: 2 rolls of 135.' */
  undone?: string | undefined;
  /** Why it is not sent. */
  why?: string;
  /** Sends the same action again, under its own id. */
  again?: () => void;
}

export const strip = createStore<Strip | null>(null);

export const showStrip = (next: Strip): void => strip.set(() => next);
export const clearStrip = (): void => strip.set(() => null);

/** Changes the strip only while it still speaks of that action. */
export const updateStrip = (actionId: string, change: Partial<Strip>): void =>
  strip.set((now) => (now?.actionId === actionId ? { ...now, ...change } : now));
