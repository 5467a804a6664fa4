import { Injectable } from '@nestjs/common';
import type { ActionKind } from '@wetside/db';
import type { Tx } from '../database/database.js';
import type { ActionRow } from './actions.repository.js';
import type { Recording } from './recording.js';

/** What an action moved, so that warnings can be looked at anew. */
export interface Touched {
  bottleIds: string[];
  packIds: string[];
  loadActionIds: string[];
}

export const touched = (some: Partial<Touched>): Touched => ({
  bottleIds: [],
  packIds: [],
  loadActionIds: [],
  ...some,
});

/** How actions of one kind are taken back. Everything that it needs locked it locks in `prepare`, in the ledger's order. */
export interface VoidHandler {
  /** @throws Problem 'leans-on-it' naming what later actions lean on it, 'cannot-be-voided' where it never can be */
  prepare(tx: Tx, recording: Recording, target: ActionRow): Promise<void>;
  /** Runs after the void was added: sets running totals to what they are without the target. */
  undo(tx: Tx, recording: Recording, target: ActionRow): Promise<Touched>;
}

/** Each feature says here how its own kinds of action are taken back. */
@Injectable()
export class VoidHandlers {
  private readonly handlers = new Map<ActionKind, VoidHandler>();

  register(kind: ActionKind, handler: VoidHandler): void {
    if (this.handlers.has(kind)) throw new Error(`Two features take back ${kind}.`);
    this.handlers.set(kind, handler);
  }

  of(kind: ActionKind): VoidHandler {
    const handler = this.handlers.get(kind);
    if (!handler) throw new Error(`No feature takes back ${kind}.`);
    return handler;
  }
}
