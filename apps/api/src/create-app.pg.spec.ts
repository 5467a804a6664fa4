import { Body, Controller, Get, Module, Post } from '@nestjs/common';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import request from 'supertest';
import { BySecret, LeastRole, Public } from './platform/auth/access.decorators.js';
import { CallerInfo, Caller } from './platform/auth/caller.js';
import { DarkroomAccess } from './platform/auth/darkroom-access.js';
import { TestApp, type TestPerson } from './testing/test-app.js';

@Controller()
class TrialController {
  constructor(private readonly access: DarkroomAccess) {}

  @Get('trial/broken')
  @Public()
  broken(): never {
    throw new Error('select * from secrets');
  }

  @Post('trial/echo/:secret')
  @BySecret()
  echo(@Body() body: unknown): unknown {
    return body;
  }

  @Get('darkrooms/:darkroomId/trial/forgotten')
  @LeastRole('member')
  forgotten(): string {
    return 'everything';
  }

  @Get('darkrooms/:darkroomId/trial/manager')
  @LeastRole('manager')
  manager(@Caller() caller: CallerInfo): Promise<{ role: string }> {
    return this.access.enter(caller, 'riverside', (_tx, { role }) => Promise.resolve({ role }));
  }
}

@Module({ controllers: [TrialController] })
class TrialModule {}

let web: string;
let t: TestApp;
let ada: TestPerson;
beforeAll(async () => {
  web = await mkdtemp(join(tmpdir(), 'web-'));
  await mkdir(join(web, 'assets'));
  await writeFile(join(web, 'index.html'), '<!doctype html><title>Wetside</title>');
  await writeFile(join(web, 'sw.js'), '// worker');
  await writeFile(join(web, 'assets', 'index-1a2b3c.js'), '// program');
  t = await TestApp.start({ WEB_DIST: web, PUBLIC_ORIGIN: 'https://darkroom.example' }, [TrialModule]);
  ada = await t.person('Ada');
  await t.darkroom('riverside', ada);
});
afterAll(async () => {
  await t.close();
  await rm(web, { recursive: true });
});

const cookieLines = (response: request.Response): string[] => {
  const lines: unknown = response.get('set-cookie');
  return Array.isArray(lines) ? lines.map(String) : [];
};

const get = (path: string) => request(t.app.getHttpServer()).get(path);

describe('every answer', () => {
  it.each(['/api/health', '/api/nowhere', '/api/trial/broken', '/', '/assets/index-1a2b3c.js'])(
    'of %s has the headers that hold the browser',
    async (path) => {
      const { headers } = await get(path);
      expect(headers['content-security-policy']).toBe(
        "default-src 'self';script-src 'self';style-src 'self' 'unsafe-inline';img-src 'self' blob: data:;object-src 'none';base-uri 'none';form-action 'self';frame-ancestors 'none';upgrade-insecure-requests",
      );
      expect(headers['strict-transport-security']).toBe('max-age=31536000; includeSubDomains');
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['x-wetside-now']).toMatch(/Z$/);
      expect(headers['x-powered-by']).toBeUndefined();
      expect(headers['access-control-allow-origin']).toBeUndefined();
    },
  );

  it('that is a failure is a problem document without the inside of the program', async () => {
    const broken = await get('/api/trial/broken').expect(500);
    expect(broken.headers['content-type']).toContain('application/problem+json');
    expect(broken.body).toMatchObject({ code: 'broken', status: 500 });
    expect(broken.text).not.toMatch(/select|secrets|\.ts/);
    expect((await get('/api/nowhere').expect(404)).body.code).toBe('not-found');
  });
});

describe('a body', () => {
  const post = (body: string) =>
    request(t.app.getHttpServer()).post('/api/trial/echo/x').type('json').send(body);

  it('is JSON', async () => {
    expect((await post('{"a":').expect(400)).body.code).toBe('malformed');
    expect((await post('{"a":1}').expect(201)).body).toEqual({ a: 1 });
  });

  it('has 256 kB at the most', async () => {
    expect((await post(JSON.stringify('x'.repeat(256 * 1024))).expect(413)).body.code).toBe('too-large');
    await post(JSON.stringify({ text: 'x'.repeat(255 * 1024) })).expect(201);
  });
});

describe('with https', () => {
  it('the cookies are held to the host', async () => {
    const body = { email: ada.email, passphrase: 'four quiet trays by the sink' };
    const response = await t.browser().post('/api/sign-in').send(body).expect(200);
    const lines = cookieLines(response);
    expect(lines).toHaveLength(3);
    for (const line of lines)
      expect(line).toMatch(
        /^__Host-wetside-(access|refresh|device)=.*; Path=\/; .*HttpOnly; Secure; SameSite=Lax$/,
      );
  });
});

describe('a darkroom’s route', () => {
  const signIn = async (person: TestPerson): Promise<string> => {
    const body = { email: person.email, passphrase: 'four quiet trays by the sink' };
    const response = await t.browser().post('/api/sign-in').send(body).expect(200);
    return cookieLines(response)
      .map((line) => line.split(';')[0])
      .join('; ');
  };

  it('is not answered when it never asked who is there', async () => {
    const response = await get('/api/darkrooms/riverside/trial/forgotten')
      .set('cookie', await signIn(ada))
      .expect(500);
    expect(response.text).not.toContain('everything');
  });

  it('takes its least role, read anew with each request', async () => {
    const bo = await t.person('Bo');
    const darkroomId = await t.database.asPerson(ada.personId, async (tx) => {
      const own = await tx.query.memberships.findFirst();
      return own?.darkroomId ?? '';
    });
    await t.join(darkroomId, bo, 'technician');
    const path = '/api/darkrooms/riverside/trial/manager';
    const refused = await get(path)
      .set('cookie', await signIn(bo))
      .expect(403);
    expect(refused.body).toMatchObject({
      code: 'not-allowed',
      detail: 'This takes a manager of the darkroom.',
    });
    await get(path)
      .set('cookie', await signIn(ada))
      .expect(200, { role: 'manager' });
  });
});

describe('the web program', () => {
  it.each(['/', '/d/riverside/bottles', '/b/0190c8a0-0000-7000-8000-000000000001/FX12'])(
    'is what %s shows',
    async (path) => {
      const response = await get(path).expect(200);
      expect(response.text).toContain('<title>Wetside</title>');
      expect(response.headers['cache-control']).toBe('no-cache');
    },
  );

  it('is kept for ever where the name changes with the content, and asked for again where it does not', async () => {
    const hashed = await get('/assets/index-1a2b3c.js').expect(200);
    expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect((await get('/sw.js').expect(200)).headers['cache-control']).toBe('no-cache');
  });

  it('does not stand in for a file that is not there, nor for the API', async () => {
    await get('/assets/gone.js').expect(404);
    expect((await get('/api/darkroom').expect(404)).headers['content-type']).toContain('problem+json');
    await get('/../package.json').expect(404);
  });
});

it('the API’s documents are there outside real use', async () => {
  const { body } = await get('/api/docs-json').expect(200);
  expect(Object.keys(body.paths)).toEqual(
    expect.arrayContaining(['/sign-in', '/darkrooms/{darkroomId}', '/me']),
  );
  expect(body.paths['/me'].get.responses.default.content).toHaveProperty(['application/problem+json']);
  expect(body.components.schemas.SignInRequest.required).toEqual(['email', 'passphrase']);
});

it('in real use the API’s documents are not there, and a trusted proxy alone may say where a request came from', async () => {
  const real = await TestApp.start({
    MODE: 'real',
    PUBLIC_ORIGIN: 'https://darkroom.example',
    SMTP_URL: 'smtp://127.0.0.1:1',
    MAIL_FROM: 'Wetside <wetside@darkroom.example>',
    TRUSTED_PROXY: 'loopback',
    LOG_LEVEL: 'silent',
  });
  try {
    for (const path of ['/api/docs', '/api/docs-json', '/api/docs-yaml', '/metrics', '/.env'])
      await real.browser().get(path).expect(404);
    const guess = (address: string) =>
      real
        .browser()
        .post('/api/sign-in')
        .set('x-forwarded-for', address)
        .send({
          email: `${address}-${(tries += 1)}@darkroom.example`,
          passphrase: 'not the right passphrase',
        });
    let tries = 0;
    for (let i = 0; i < 30; i += 1) await guess('192.0.2.7').expect(401);
    await guess('192.0.2.7').expect(429);
    await guess('192.0.2.8').expect(401);
  } finally {
    await real.close();
  }
});
