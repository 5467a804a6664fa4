import { Body, Controller, Module, Param, Put, Res } from '@nestjs/common';
import { lots } from '@wetside/db';
import { eq, sql } from 'drizzle-orm';
import type { Response } from 'express';
import { writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { reconcile } from '../cli/reconcile/reconcile.js';
import { FilledHouse } from '../testing/filled-house.js';
import { TestApp } from '../testing/test-app.js';
import { LeastRole } from '../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../platform/auth/caller.js';
import { DarkroomAccess } from '../platform/auth/darkroom-access.js';
import { attempts, put, type Attempts } from '../walks/route-attempts.js';
import { Fuzzer, NOTHING_YET } from './fuzzer.js';
import { sender } from './wire.js';

const { FUZZ_REQUESTS = '1000', FUZZ_SEED = '20261201', FUZZ_REPORT } = process.env;
/** A house is sent so many, then the next one is opened: no darkroom has a hundred thousand bottles. */
const EACH = 1_000;
const HOUR = 3_600_000;

/** Routes that a careless hand might write, behind no look at what is sent. */
@Controller('darkrooms/:darkroomId')
class CarelessController {
  constructor(private readonly access: DarkroomAccess) {}

  @Put('fragile/:actionId')
  @LeastRole('manager')
  fragile(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string, @Body() body: unknown) {
    return this.access.enter(caller, darkroom, () => {
      const { content } = body as { content: { reason: string } };
      return Promise.resolve(content.reason.trim());
    });
  }

  @Put('curt/:actionId')
  @LeastRole('manager')
  curt(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string, @Res() response: Response) {
    return this.access.enter(caller, darkroom, () => Promise.resolve(response.status(400).send('no')));
  }

  @Put('leaky/:actionId')
  @LeastRole('manager')
  leaky(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string) {
    return this.access.enter(caller, darkroom, async (tx, { darkroomId }) => {
      await tx
        .update(lots)
        .set({ unopened: sql`${lots.unopened} + 1` })
        .where(eq(lots.darkroomId, darkroomId));
      return 'done';
    });
  }
}

@Module({ controllers: [CarelessController] })
class CarelessModule {}

let t: TestApp;
let first: FilledHouse;
let wire: ReturnType<typeof sender>;

beforeAll(async () => {
  t = await TestApp.start({}, [CarelessModule], { background: false, logLevel: 'silent' });
  await t.app.listen(0, '127.0.0.1');
  const { port } = t.app.getHttpServer().address() as AddressInfo;
  wire = sender(port);
  first = await FilledHouse.open(t, 'house-0');
}, 60_000);
afterAll(async () => {
  wire.close();
  await t.close();
});

it(
  'whatever is sent, the answer is a good one or a reason, and the figures stand',
  async () => {
    const wanted = Number(FUZZ_REQUESTS);
    const seed = Number(FUZZ_SEED);
    const began = performance.now();
    const fuzzed = NOTHING_YET();
    for (let house = 0; fuzzed.requests < wanted; house += 1) {
      const fuzzer = new Fuzzer(
        house === 0 ? first : await FilledHouse.open(t, `house-${house}`),
        wire,
        attempts,
      );
      await fuzzer.run(Math.min(EACH, wanted - fuzzed.requests), seed + house, fuzzed);
      // Tries at signing in are slowed down for a while: the next house begins after that.
      t.clock.advance(HOUR);
    }
    const seconds = (performance.now() - began) / 1000;
    const reconciled = await reconcile(t.db.adminUrl, t.clock.now());
    const after = await wire.send({ method: 'GET', target: '/api/ready', headers: {}, body: undefined });
    if (FUZZ_REPORT)
      writeFileSync(
        FUZZ_REPORT,
        JSON.stringify({ seed, seconds, ...fuzzed, reconciled, ready: after.status }),
      );
    expect(fuzzed.complaints).toEqual([]);
    expect(Object.keys(attempts).filter((route) => !(route in fuzzed.byRoute))).toEqual([]);
    expect(reconciled.differences).toEqual([]);
    expect(after.status).toBe(200);
    process.stdout.write(`${fuzzed.requests} requests, seed ${seed}: ${JSON.stringify(fuzzed.byCode)}\n`);
  },
  60_000 + Number(FUZZ_REQUESTS) * 100,
);

describe('the fuzz sees', () => {
  const careless = async (what: string) => {
    const known: Attempts = {
      [`PUT /darkrooms/:darkroomId/${what}/:actionId`]: (h) => put(h, what, { reason: 'cloudy' }),
    };
    const fuzzed = NOTHING_YET();
    await new Fuzzer(first, wire, known).run(30, 7, fuzzed);
    return fuzzed.complaints.join('\n');
  };

  it('mutant: a route that falls over, and says with which request', async () => {
    expect(await careless('fragile')).toMatch(
      /fragile.*: 500 .*seed 7, lane \d, request \d+\) \{"method":"PUT"/,
    );
  });

  it('mutant: a route that refuses without a reason', async () => {
    expect(await careless('curt')).toContain('400 as text/html');
  });

  it('mutant: a route that moves a figure and records nothing', async () => {
    expect(await careless('leaky')).toBe('');
    const { differences } = await reconcile(t.db.adminUrl, t.clock.now());
    expect(differences.length).toBeGreaterThan(0);
  });
});
