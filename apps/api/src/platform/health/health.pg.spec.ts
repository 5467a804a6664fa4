import { Controller, Get, Module } from '@nestjs/common';
import { mails } from '@wetside/db';
import postgres from 'postgres';
import request from 'supertest';
import { v7 } from 'uuid';
import { TestApp } from '../../testing/test-app.js';
import { until } from '../../testing/until.js';
import { Public } from '../auth/access.decorators.js';
import { JobRunner } from '../jobs/job-runner.js';

let letGo: () => void = () => undefined;
let arrived = 0;

/** A request that takes as long as the test wants. */
@Controller('slow')
class SlowController {
  @Get()
  @Public()
  async slow(): Promise<{ done: boolean }> {
    arrived += 1;
    await new Promise<void>((resolve) => (letGo = resolve));
    return { done: true };
  }
}

@Module({ controllers: [SlowController] })
class SlowModule {}

describe('whether the server is ready', () => {
  let t: TestApp;
  let root: postgres.Sql;
  beforeAll(async () => {
    t = await TestApp.start();
    root = postgres(t.db.superUrl, { max: 1, onnotice: () => undefined });
  });
  afterAll(async () => {
    await root.end();
    await t.close();
  });
  const get = (path: string) => request(t.app.getHttpServer()).get(path);

  it('yes, on a database of this version', async () => {
    await get('/api/ready').expect(200, { ok: true });
  });

  it('no, while a migration is missing; it is alive all the same', async () => {
    await root`alter table mails rename column withdrawn_because to old_name`;
    const answer = await get('/api/ready').expect(503);
    expect(answer.text).not.toContain('withdrawn_because');
    await get('/api/health').expect(200, { ok: true });
    await root`alter table mails rename column old_name to withdrawn_because`;
    await get('/api/ready').expect(200);
  });

  it('no, while the database lets nobody in; it is alive all the same', async () => {
    await root`revoke connect on database ${root(t.db.name)} from wetside_app`;
    await root`select pg_terminate_backend(pid) from pg_stat_activity where datname = ${t.db.name} and usename = 'wetside_app'`;
    await get('/api/ready').expect(503);
    await get('/api/health').expect(200);
    await root`grant connect on database ${root(t.db.name)} to wetside_app`;
    await until(async () => (await get('/api/ready')).status === 200);
  });
});

describe('stopping', () => {
  it('answers what was asked, lets nobody new in, and leaves a lease to run out', async () => {
    const t = await TestApp.start({}, [SlowModule]);
    const person = await t.person('Ada Stop');
    const darkroomId = await t.darkroom('stopping', person);
    const leased = {
      state: 'leased' as const,
      leaseId: v7(),
      leaseUntil: new Date(t.clock.now().getTime() + 60_000),
    };
    await t.database.inDarkroom({ darkroomId }, (tx) =>
      tx.insert(mails).values({
        darkroomId,
        id: v7(),
        kind: 'order',
        toAddress: 'orders@supplier.example',
        subject: 'An order',
        body: 'Two kits.',
        messageId: '<stop@darkroom.example>',
        dedupeKey: 'stop',
        dueAt: t.clock.now(),
        attempts: 1,
        createdAt: t.clock.now(),
        ...leased,
      }),
    );
    let queueStopped = false;
    const runner = t.app.get(JobRunner, { strict: false });
    const stopQueue = runner.beforeApplicationShutdown.bind(runner);
    runner.beforeApplicationShutdown = () => {
      queueStopped = true;
      return stopQueue();
    };
    await t.app.listen(0, '127.0.0.1');
    const url = await t.app.getUrl();

    const answer = fetch(`${url}/api/slow`);
    await until(() => arrived === 1);
    const closed = t.app.close();
    await until(async () =>
      fetch(`${url}/api/health`).then(
        () => false,
        () => true,
      ),
    );
    // The queue goes on until the last answer is out.
    expect(queueStopped).toBe(false);
    letGo();
    const response = await answer;
    expect([response.status, await response.json()]).toEqual([200, { done: true }]);
    await closed;
    expect(queueStopped).toBe(true);

    const admin = postgres(t.db.adminUrl, { max: 1 });
    const [row] =
      await admin`select state, lease_id as "leaseId", lease_until as "leaseUntil" from mails where darkroom_id = ${darkroomId}`;
    expect(row).toEqual(leased);
    await admin.end();
    await t.db.drop();
  });
});
