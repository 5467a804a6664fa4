import { Injectable } from '@nestjs/common';
import { credentials, people } from '@wetside/db';
import { v7 } from 'uuid';
import { Clock } from '../clock/clock.js';
import type { Tx } from '../database/database.js';
import { invalid } from '../errors/problem.js';
import { passphraseComplaint } from './passphrase-rules.js';
import { Passphrases } from './passphrases.js';

export interface NewAccount {
  email: string;
  name: string;
  passphrase: string;
}

/** An account with its passphrase hashed, ready to be written. */
export interface PreparedAccount {
  personId: string;
  email: string;
  name: string;
  passphraseHash: string;
}

@Injectable()
export class Accounts {
  constructor(
    private readonly clock: Clock,
    private readonly passphrases: Passphrases,
  ) {}

  /**
   * Checks and hashes before any transaction is open, for hashing takes long.
   * @throws Problem 'invalid' on the passphrase
   */
  async prepare({ email, name, passphrase }: NewAccount): Promise<PreparedAccount> {
    const complaint = passphraseComplaint(passphrase, email);
    if (complaint !== null) throw invalid([{ field: 'passphrase', message: complaint }]);
    const passphraseHash = await this.passphrases.hash(passphrase);
    return { personId: v7(), email: email.trim().toLowerCase(), name, passphraseHash };
  }

  /** @throws a unique violation on people_email when the address is taken */
  async add(tx: Tx, { personId, email, name, passphraseHash }: PreparedAccount): Promise<void> {
    const now = this.clock.now();
    await tx.insert(people).values({ id: personId, email, name, createdAt: now });
    await tx.insert(credentials).values({ personId, passphraseHash, changedAt: now });
  }
}
