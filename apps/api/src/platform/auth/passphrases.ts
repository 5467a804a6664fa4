import { hash, verify } from '@node-rs/argon2';
import { Injectable } from '@nestjs/common';
import { Turnstile } from '../turnstile/turnstile.js';

/** OWASP's figures for argon2id (the library's default kind): 19 MiB, two passes, one lane. */
const ARGON2 = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Hashes and checks passphrases, at most two at once, so that a crowd at the door does not eat the memory. */
@Injectable()
export class Passphrases {
  private readonly turnstile = new Turnstile(2);
  private decoy: Promise<string> | null = null;

  hash(passphrase: string): Promise<string> {
    return this.turnstile.pass(() => hash(passphrase.normalize('NFC'), ARGON2));
  }

  /** With no stored hash it works just as long and says no: the time taken does not tell who is known here. */
  async verify(stored: string | null, passphrase: string): Promise<boolean> {
    const nobodys = await this.nobodys();
    const against = stored ?? nobodys;
    const same = await this.turnstile.pass(() => verify(against, passphrase.normalize('NFC')));
    return same && stored !== null;
  }

  private async nobodys(): Promise<string> {
    this.decoy ??= this.hash('nobody has this passphrase');
    try {
      return await this.decoy;
    } catch (error) {
      this.decoy = null;
      throw error;
    }
  }
}
