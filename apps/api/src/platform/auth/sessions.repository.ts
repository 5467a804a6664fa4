import { credentials, people, refreshTokens, sessions } from '@wetside/db';
import { and, eq, gt, isNull, ne, or } from 'drizzle-orm';
import { Injectable } from '@nestjs/common';
import type { Tx } from '../database/database.js';
import { REFRESH_IDLE_S, SESSION_S } from './lifetimes.js';

export type EndedWhy = 'signed-out' | 'reuse' | 'passphrase-changed' | 'ended-elsewhere';

const before = (now: Date, seconds: number) => new Date(now.getTime() - seconds * 1000);

/** A session that has not ended, was used lately, and is not older than any session may be. */
export function sessionIsAlive(now: Date) {
  const { usedAfter, madeAfter } = aliveSince(now);
  return and(isNull(sessions.endedAt), gt(sessions.lastUsedAt, usedAfter), gt(sessions.createdAt, madeAfter));
}

/** A session that is alive was used, and was made, after these. */
export const aliveSince = (now: Date) => ({
  usedAfter: before(now, REFRESH_IDLE_S),
  madeAfter: before(now, SESSION_S),
});

@Injectable()
export class SessionsRepository {
  async personByEmail(tx: Tx, email: string) {
    const [row] = await tx
      .select({ id: people.id, name: people.name, passphraseHash: credentials.passphraseHash })
      .from(people)
      .leftJoin(credentials, eq(credentials.personId, people.id))
      .where(and(eq(people.email, email), isNull(people.deletedAt)));
    return row ?? null;
  }

  async person(tx: Tx, personId: string) {
    const [row] = await tx
      .select({ id: people.id, name: people.name })
      .from(people)
      .where(eq(people.id, personId));
    return row ?? null;
  }

  async addSession(tx: Tx, row: { id: string; personId: string; now: Date }): Promise<void> {
    await tx
      .insert(sessions)
      .values({ id: row.id, personId: row.personId, createdAt: row.now, lastUsedAt: row.now });
  }

  async addToken(tx: Tx, row: typeof refreshTokens.$inferInsert): Promise<void> {
    await tx.insert(refreshTokens).values(row);
  }

  async aliveSession(tx: Tx, sessionId: string, personId: string, now: Date) {
    const [row] = await tx
      .select({ id: sessions.id })
      .from(sessions)
      .innerJoin(people, and(eq(people.id, sessions.personId), isNull(people.deletedAt)))
      .where(and(eq(sessions.id, sessionId), eq(sessions.personId, personId), sessionIsAlive(now)));
    return row ?? null;
  }

  /** The session a token belongs to, locked, so that two tabs rotate one after the other. */
  async lockByToken(tx: Tx, hash: string, now: Date) {
    const [owner] = await tx
      .select({ sessionId: refreshTokens.sessionId })
      .from(refreshTokens)
      .where(eq(refreshTokens.hash, hash));
    if (!owner) return null;
    const [session] = await tx
      .select({ id: sessions.id, personId: sessions.personId })
      .from(sessions)
      .where(and(eq(sessions.id, owner.sessionId), sessionIsAlive(now)))
      .for('update');
    return session ?? null;
  }

  async token(tx: Tx, hash: string) {
    const [row] = await tx.select().from(refreshTokens).where(eq(refreshTokens.hash, hash));
    return row ?? null;
  }

  /** Marks a token used; what came before it, and what else came of that, is from now on a sign of theft. */
  async use(tx: Tx, token: { hash: string; predecessorHash: string | null; sessionId: string }, now: Date) {
    const inSession = eq(refreshTokens.sessionId, token.sessionId);
    await tx.update(refreshTokens).set({ usedAt: now }).where(eq(refreshTokens.hash, token.hash));
    await tx.update(sessions).set({ lastUsedAt: now }).where(eq(sessions.id, token.sessionId));
    if (token.predecessorHash === null) return;
    const older = or(
      eq(refreshTokens.hash, token.predecessorHash),
      eq(refreshTokens.predecessorHash, token.predecessorHash),
    );
    await tx
      .update(refreshTokens)
      .set({ supersededAt: now })
      .where(and(inSession, older, ne(refreshTokens.hash, token.hash), isNull(refreshTokens.supersededAt)));
  }

  async end(tx: Tx, sessionId: string, why: EndedWhy, now: Date): Promise<void> {
    await tx
      .update(sessions)
      .set({ endedAt: now, endedWhy: why })
      .where(and(eq(sessions.id, sessionId), isNull(sessions.endedAt)));
  }

  async sessionOfToken(tx: Tx, hash: string): Promise<string | null> {
    const row = await this.token(tx, hash);
    return row?.sessionId ?? null;
  }
}
