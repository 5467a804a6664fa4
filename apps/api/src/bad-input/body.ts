import { v7 } from 'uuid';
import type { World } from './world.js';

/** A receipt, its body sent letter by letter. */
export const post = (w: World, text: string | Buffer, headers: Record<string, string> = {}) =>
  w.technician
    .put(w.url(`receipts/${v7()}`))
    .set({ 'content-type': 'application/json', ...headers })
    // Bytes stay as they are; a buffer would be written out as JSON.
    .serialize((body: unknown) => body as string)
    .send(text);

export const text = (w: World, change: Record<string, unknown> = {}) =>
  JSON.stringify(w.told({ ...w.receipt(), ...change }));

/** The content with this text put in where its first brace opens. */
export const withKey = (w: World, key: string) => text(w).replace('"content":{', `"content":{${key},`);

export const nested = (levels: number, open: string, close: string, inside = '') =>
  open.repeat(levels) + inside + close.repeat(levels);
