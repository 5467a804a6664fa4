import { Injectable } from '@nestjs/common';
import { v7 } from 'uuid';
import { Accounts } from '../../platform/auth/accounts.js';
import { SessionsRepository } from '../../platform/auth/sessions.repository.js';
import { Database } from '../../platform/database/database.js';
import { isUniqueViolation } from '../../platform/database/sql-errors.js';
import { problem } from '../../platform/errors/problem.js';
import { ProvisionService, type Provisioned } from './provision.service.js';

export interface DarkroomOrder {
  name: string;
  shortName: string;
  zone: string;
  email: string;
  personName: string;
}

/** Opens a darkroom for whoever runs the server: with its first manager, who may be known here already. */
@Injectable()
export class DarkroomNewService {
  constructor(
    private readonly database: Database,
    private readonly accounts: Accounts,
    private readonly people: SessionsRepository,
    private readonly provision: ProvisionService,
  ) {}

  /** The person of that address, or null. */
  knownPerson(email: string): Promise<{ id: string } | null> {
    return this.database.asIdentity((tx) => this.people.personByEmail(tx, email.trim().toLowerCase()), {
      readOnly: true,
    });
  }

  /**
   * @param passphrase asked for only when the address is new here
   * @throws Problem 'short-name-taken', 'short-name-shape', 'zone-unknown', 'invalid'
   */
  async open(order: DarkroomOrder, passphrase: () => Promise<string>): Promise<Provisioned> {
    const { email, personName, ...darkroom } = order;
    const known = await this.knownPerson(email);
    const account = known
      ? null
      : await this.accounts.prepare({ email, name: personName, passphrase: await passphrase() });
    const personId = known?.id ?? account?.personId ?? '';
    const darkroomId = v7();
    try {
      return await this.database.inDarkroom({ darkroomId, personId }, async (tx) => {
        if (account) await this.accounts.add(tx, account);
        return this.provision.provisionDarkroom(tx, {
          ...darkroom,
          darkroomId,
          manager: { personId, displayName: personName },
        });
      });
    } catch (error) {
      if (isUniqueViolation(error, 'darkrooms_short_name'))
        throw problem('short-name-taken', order.shortName);
      throw error;
    }
  }
}
