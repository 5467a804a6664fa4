import { Injectable } from '@nestjs/common';
import { rateCounters } from '@wetside/db';
import { and, eq, sql } from 'drizzle-orm';
import { Clock } from '../clock/clock.js';
import { Database, type Tx } from '../database/database.js';
import { problem, type Problem } from '../errors/problem.js';
import { ADDRESS_FAILURES, ADDRESS_WINDOW_S, delayS, networkOf, PERSON_MEMORY_S } from './throttle-rules.js';
import { secretHash } from './tokens.js';

/** Whose tries are counted: the account aimed at (or one known device of it) and the network address they come from. */
export interface Tries {
  email: string;
  deviceId: string | null;
  address: string;
}

interface Counter {
  windowStart: Date;
  count: number;
}

const FOR_PERSON = 'sign-in:person';
const FOR_ADDRESS = 'sign-in:address';

/** Slows guessing down, by counters that every server process shares. A try is counted before it is judged. */
@Injectable()
export class Throttle {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
  ) {}

  /** @throws Problem 'too-many' with Retry-After when it is too soon; else the try stands as a failure until `clear`. */
  async take(tries: Tries): Promise<void> {
    const refused = await this.database.asIdentity(async (tx) => {
      const now = this.clock.now();
      // Always the person's counter before the address's, so that two tries cannot wait for each other.
      const person = await this.lock(tx, FOR_PERSON, personKey(tries), now);
      const address = await this.lock(tx, FOR_ADDRESS, addressKey(tries), now);
      const wait = Math.max(waitS(person, now), waitS(address, now));
      if (wait > 0) return tooMany(wait);
      await this.countPerson(tx, tries, person, now);
      await this.countAddress(tx, tries, address, now);
      return null;
    });
    if (refused) throw refused;
  }

  /** The try was right: the person's row of failures is over, and the address gets this one back. */
  async clear(tx: Tx, tries: Tries): Promise<void> {
    await tx.delete(rateCounters).where(is(FOR_PERSON, personKey(tries)));
    await tx
      .update(rateCounters)
      .set({ count: sql`greatest(${rateCounters.count} - 1, 0)`, blockedUntil: null })
      .where(is(FOR_ADDRESS, addressKey(tries)));
  }

  private async lock(tx: Tx, subject: string, key: string, now: Date) {
    const [row] = await tx
      .insert(rateCounters)
      .values({ subject, key, windowStart: now, count: 0 })
      // An update that changes nothing, for it locks the row and gives it back, new or old.
      .onConflictDoUpdate({ target: [rateCounters.subject, rateCounters.key], set: { key } })
      .returning();
    if (!row) throw new Error('A counter was neither found nor made.');
    return row;
  }

  private async countPerson(tx: Tx, tries: Tries, row: Counter, now: Date): Promise<void> {
    const count = isOver(row, PERSON_MEMORY_S, now) ? 1 : row.count + 1;
    await tx
      .update(rateCounters)
      .set({ windowStart: now, count, blockedUntil: later(now, delayS(count)) })
      .where(is(FOR_PERSON, personKey(tries)));
  }

  private async countAddress(tx: Tx, tries: Tries, row: Counter, now: Date): Promise<void> {
    const fresh = isOver(row, ADDRESS_WINDOW_S, now);
    const windowStart = fresh ? now : row.windowStart;
    const count = fresh ? 1 : row.count + 1;
    const blockedUntil = count >= ADDRESS_FAILURES ? later(windowStart, ADDRESS_WINDOW_S) : null;
    await tx
      .update(rateCounters)
      .set({ windowStart, count, blockedUntil })
      .where(is(FOR_ADDRESS, addressKey(tries)));
  }
}

const is = (subject: string, key: string) =>
  and(eq(rateCounters.subject, subject), eq(rateCounters.key, key));
const isOver = (row: Counter, seconds: number, now: Date) =>
  now.getTime() - row.windowStart.getTime() >= seconds * 1000;
const later = (at: Date, seconds: number) => new Date(at.getTime() + seconds * 1000);

/** The address is stored as a digest: tries aimed at people who are not known here leave no list of addresses. */
const personKey = ({ email, deviceId }: Tries) => secretHash(`${email} ${deviceId ?? ''}`);
const addressKey = ({ address }: Tries) => secretHash(networkOf(address));

function waitS(row: { blockedUntil: Date | null }, now: Date): number {
  const ms = (row.blockedUntil?.getTime() ?? 0) - now.getTime();
  return Math.max(0, Math.ceil(ms / 1000));
}

function tooMany(seconds: number): Problem {
  return problem('too-many', seconds).withHeaders({ 'retry-after': String(seconds) });
}
