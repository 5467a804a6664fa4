import { Injectable, Logger } from '@nestjs/common';
import { v7 } from 'uuid';
import type { CallerInfo } from '../../platform/auth/caller.js';
import { Passphrases } from '../../platform/auth/passphrases.js';
import { SessionsRepository } from '../../platform/auth/sessions.repository.js';
import { Sessions, type Keys } from '../../platform/auth/sessions.js';
import { Throttle } from '../../platform/auth/throttle.js';
import { Tokens } from '../../platform/auth/tokens.js';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import type { MeView, SignedInView, SignInRequest } from './sign-in.dto.js';
import { SignInRepository } from './sign-in.repository.js';

/** What the browser brings along: its network address and, perhaps, the mark of an earlier sign-in. */
export interface Visitor {
  address: string;
  deviceToken: string | null;
}

export interface Opened {
  view: SignedInView;
  keys: Keys;
  /** The mark by which this browser is known to the person from now on. */
  deviceToken: string;
}

@Injectable()
export class SignInService {
  private readonly logger = new Logger('sign-in');

  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly passphrases: Passphrases,
    private readonly throttle: Throttle,
    private readonly tokens: Tokens,
    private readonly sessions: Sessions,
    private readonly accounts: SessionsRepository,
    private readonly repository: SignInRepository,
  ) {}

  /** @throws Problem 'sign-in-refused', the same for a wrong passphrase as for an unknown address; 'too-many'. */
  async signIn({ email, passphrase }: SignInRequest, visitor: Visitor): Promise<Opened> {
    const person = await this.database.asIdentity((tx) => this.accounts.personByEmail(tx, email), {
      readOnly: true,
    });
    const device = visitor.deviceToken === null ? null : this.tokens.readDevice(visitor.deviceToken);
    // A device that was here before has a counter of its own: guesses made elsewhere do not keep its owner out.
    const deviceId = device && device.personId === person?.id ? device.deviceId : null;
    const tries = { email, deviceId, address: visitor.address };
    await this.throttle.take(tries);
    const right = await this.passphrases.verify(person?.passphraseHash ?? null, passphrase);
    if (!person || !right) {
      this.logger.warn({ personId: person?.id ?? null }, 'sign-in refused');
      throw problem('sign-in-refused');
    }
    const keys = await this.database.asIdentity(async (tx) => {
      await this.throttle.clear(tx, tries);
      return this.sessions.start(tx, person.id);
    });
    this.logger.log({ personId: person.id }, 'signed in');
    const view = {
      person: { id: person.id, name: person.name },
      darkrooms: await this.darkroomsOf(person.id),
    };
    return { view, keys, deviceToken: this.tokens.device(person.id, deviceId ?? v7()) };
  }

  async me({ personId }: CallerInfo): Promise<MeView> {
    const person = await this.database.asIdentity((tx) => this.accounts.person(tx, personId), {
      readOnly: true,
    });
    if (!person) throw problem('session-ended');
    return { person, darkrooms: await this.darkroomsOf(personId), now: this.clock.nowIso() };
  }

  private darkroomsOf(personId: string) {
    return this.database.asPerson(personId, (tx) => this.repository.ownDarkrooms(tx, personId), {
      readOnly: true,
    });
  }
}
