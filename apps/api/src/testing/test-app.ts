import type { Type } from '@nestjs/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { memberships } from '@wetside/db';
import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import request from 'supertest';
import { v7 } from 'uuid';
import { readEnvironment, type Environment } from '../config/environment.js';
import type { Variables } from '../config/reader.js';
import { createApp, startUp } from '../create-app.js';
import { ProvisionService, type NewDarkroom } from '../features/darkrooms/provision.service.js';
import { Accounts } from '../platform/auth/accounts.js';
import type { Role } from '../platform/auth/roles.js';
import { Clock } from '../platform/clock/clock.js';
import { Database } from '../platform/database/database.js';

export const PASSPHRASE = 'four quiet trays by the sink';
export const ORIGIN = 'http://localhost:55500';
export const SECRET = 'a secret that is only ever used in tests';

/** A browser of its own: it keeps its cookies and says where its requests come from. */
export type Browser = ReturnType<typeof request.agent>;

export interface TestPerson {
  personId: string;
  email: string;
  name: string;
}

/** The program on a database of its own, with shortcuts to people and darkrooms. */
export class TestApp {
  private constructor(
    readonly app: NestExpressApplication,
    readonly db: TestDatabase,
  ) {}

  /** @param changed settings that no variable reaches, such as the queue and the sweep being off */
  static async start(
    variables: Variables = {},
    extra: readonly Type[] = [],
    changed: Partial<Environment> = {},
  ): Promise<TestApp> {
    const db = await cloneDatabase();
    const read = readEnvironment({
      MODE: 'test',
      PUBLIC_ORIGIN: ORIGIN,
      DATABASE_URL: db.appUrl,
      DATABASE_JOBS_URL: db.jobsUrl,
      SESSION_SECRET: SECRET,
      ...variables,
    });
    const environment = Object.assign(read, changed);
    try {
      const app = await createApp(environment, extra);
      await startUp(app);
      return new TestApp(app, db);
    } catch (error) {
      await db.drop();
      throw error;
    }
  }

  async close(): Promise<void> {
    await this.app.close();
    await this.db.drop();
  }

  get clock(): Clock {
    return this.app.get(Clock);
  }

  get database(): Database {
    return this.app.get(Database);
  }

  browser(): Browser {
    return request.agent(this.app.getHttpServer()).set('sec-fetch-site', 'same-origin');
  }

  async person(name: string): Promise<TestPerson> {
    const email = `${name.toLowerCase().replaceAll(' ', '.')}@darkroom.example`;
    const accounts = this.app.get(Accounts);
    const account = await accounts.prepare({ email, name, passphrase: PASSPHRASE });
    await this.database.asIdentity((tx) => accounts.add(tx, account));
    return { personId: account.personId, email, name };
  }

  async darkroom(
    shortName: string,
    manager: TestPerson,
    settings?: NewDarkroom['settings'],
  ): Promise<string> {
    const darkroomId = v7();
    const order = { darkroomId, shortName, name: `The ${shortName} darkroom`, zone: 'Europe/Vienna' };
    const { personId, name } = manager;
    await this.database.inDarkroom({ darkroomId, personId }, (tx) =>
      this.app.get(ProvisionService).provisionDarkroom(tx, {
        ...order,
        manager: { personId, displayName: name },
        ...(settings ? { settings } : {}),
      }),
    );
    return darkroomId;
  }

  async join(darkroomId: string, { personId, name }: TestPerson, role: Role): Promise<string> {
    const id = v7();
    await this.database.inDarkroom({ darkroomId }, (tx) =>
      tx
        .insert(memberships)
        .values({ darkroomId, id, personId, role, displayName: name, joinedAt: this.clock.now() }),
    );
    return id;
  }

  /** A browser in which that person is signed in. */
  async signedIn({ email }: TestPerson): Promise<Browser> {
    const browser = this.browser();
    await browser.post('/api/sign-in').send({ email, passphrase: PASSPHRASE }).expect(200);
    return browser;
  }
}
