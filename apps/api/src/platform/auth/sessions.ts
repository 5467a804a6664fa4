import { Injectable, Logger } from '@nestjs/common';
import { v7 } from 'uuid';
import { Clock } from '../clock/clock.js';
import { Database, type Tx } from '../database/database.js';
import { SessionsRepository, type EndedWhy } from './sessions.repository.js';
import { randomSecret, secretHash, Tokens, type AccessClaims } from './tokens.js';

/** The two cookies' contents after a sign-in or a refresh. */
export interface Keys {
  access: string;
  refresh: string;
}

@Injectable()
export class Sessions {
  private readonly logger = new Logger('sign-in');

  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly tokens: Tokens,
    private readonly repository: SessionsRepository,
  ) {}

  /** A new session with new tokens; nothing of an earlier one is carried over. */
  async start(tx: Tx, personId: string): Promise<Keys> {
    const id = v7();
    await this.repository.addSession(tx, { id, personId, now: this.clock.now() });
    return this.issue(tx, { personId, sessionId: id }, null);
  }

  isAlive({ sessionId, personId }: AccessClaims): Promise<boolean> {
    return this.database.asIdentity(
      async (tx) => (await this.repository.aliveSession(tx, sessionId, personId, this.clock.now())) !== null,
      { readOnly: true },
    );
  }

  /**
   * New tokens for a refresh token. The old one stays good until its successor is used, for an answer may be lost on
   * the way; coming back after that it was copied, and the whole session ends.
   * @returns null when the token opens nothing (any more).
   */
  rotate(refresh: string): Promise<Keys | null> {
    const hash = secretHash(refresh);
    return this.database.asIdentity(async (tx) => {
      const now = this.clock.now();
      const session = await this.repository.lockByToken(tx, hash, now);
      // Read again under the lock: another tab may have moved it on meanwhile.
      const token = session && (await this.repository.token(tx, hash));
      if (!session || !token) return null;
      if (token.supersededAt !== null) {
        await this.repository.end(tx, session.id, 'reuse', now);
        this.logger.warn({ personId: session.personId }, 'a used token came back: the session ended');
        return null;
      }
      await this.repository.use(tx, token, now);
      return this.issue(tx, { personId: session.personId, sessionId: session.id }, hash);
    });
  }

  end(sessionId: string, why: EndedWhy): Promise<void> {
    return this.database.asIdentity((tx) => this.repository.end(tx, sessionId, why, this.clock.now()));
  }

  /** Ends whatever session a refresh token belongs to, however old the token is. */
  endByRefresh(refresh: string, why: EndedWhy): Promise<void> {
    return this.database.asIdentity(async (tx) => {
      const sessionId = await this.repository.sessionOfToken(tx, secretHash(refresh));
      if (sessionId !== null) await this.repository.end(tx, sessionId, why, this.clock.now());
    });
  }

  private async issue(tx: Tx, claims: AccessClaims, predecessorHash: string | null): Promise<Keys> {
    const refresh = randomSecret();
    const { sessionId } = claims;
    await this.repository.addToken(tx, {
      hash: secretHash(refresh),
      sessionId,
      predecessorHash,
      createdAt: this.clock.now(),
    });
    return { access: this.tokens.access(claims), refresh };
  }
}
