import { Controller, Get, Module } from '@nestjs/common';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import request from 'supertest';
import { Public } from '../platform/auth/access.decorators.js';
import { registeredRoutes } from '../platform/auth/routes.js';
import { send, without } from '../testing/send.js';
import { cookieAfter } from '../testing/signed-cookie.js';
import { PASSPHRASE, TestApp, type TestPerson } from '../testing/test-app.js';
import { cookieComplaints, headerComplaints, type Headers } from './header-complaints.js';

@Controller('trial')
class BrokenController {
  @Get('broken')
  @Public()
  broken(): never {
    throw new Error('spilt');
  }
}

@Module({ controllers: [BrokenController] })
class BrokenModule {}

const EVIL = 'https://evil.example';
const ids = /:[A-Za-z]+/g;
const SOME_ID = '0190c8a0-0000-7000-8000-000000000001';

describe.each([
  ['https', 'https://darkroom.example', true],
  ['http on localhost', 'http://localhost:55901', false],
])('with %s', (_, origin, secure) => {
  const { port } = new URL(origin);
  let web: string;
  let t: TestApp;
  let ada: TestPerson;
  beforeAll(async () => {
    web = await mkdtemp(join(tmpdir(), 'web-'));
    await mkdir(join(web, 'assets'));
    await writeFile(join(web, 'index.html'), '<!doctype html><title>Wetside</title>');
    await writeFile(join(web, 'assets', 'index-1a2b3c.js'), '// program');
    t = await TestApp.start({ WEB_DIST: web, PUBLIC_ORIGIN: origin }, [BrokenModule], { background: false });
    ada = await t.person('Ada');
  }, 60_000);
  afterAll(async () => {
    await t.close();
    await rm(web, { recursive: true });
  });

  const agent = () => request(t.app.getHttpServer());

  /** Every route, as somebody else's page would call it, and what is no route. */
  async function answers(): Promise<[string, number, Headers][]> {
    const found: [string, number, Headers][] = [];
    for (const { method, path } of registeredRoutes(t.app)) {
      const url = `/api${path.replaceAll(ids, SOME_ID)}`;
      const answer = await send(t.app, method, url).set('origin', EVIL);
      found.push([`${method} ${url}`, answer.status, answer.headers]);
    }
    for (const url of [
      '/api/nowhere',
      '/api',
      '/',
      '/d/riverside',
      '/assets/index-1a2b3c.js',
      '/assets/gone.js',
    ]) {
      const answer = await agent().get(url).set('origin', EVIL);
      found.push([`GET ${url}`, answer.status, answer.headers]);
    }
    const asked = await agent()
      .options('/api/sign-in')
      .set({ origin: EVIL, 'access-control-request-method': 'POST' });
    found.push(['OPTIONS /api/sign-in', asked.status, asked.headers]);
    return found;
  }

  it('every answer holds the browser, whatever its status', async () => {
    const all = await answers();
    const complaints = all.flatMap(([what, , headers]) =>
      headerComplaints(headers, { secure, api: what.includes(' /api') }).map((one) => `${what}: ${one}`),
    );
    expect(complaints).toEqual([]);
    const statuses = new Set(all.map(([, status]) => status));
    for (const status of [200, 401, 403, 404, 500]) expect(statuses).toContain(status);
  });

  it('every cookie that is set, renewed or cleared is held', async () => {
    const from = { 'sec-fetch-site': 'same-origin' };
    const body = { email: ada.email, passphrase: PASSPHRASE };
    const first = await agent().post('/api/sign-in').set(from).send(body).expect(200);
    const cookie = cookieAfter(first);
    const second = await agent()
      .post('/api/sign-in/refresh')
      .set({ ...from, cookie })
      .expect(204);
    const refused = await agent().post('/api/sign-in/refresh').set(from).expect(401);
    const out = await agent()
      .post('/api/sign-out')
      .set({ ...from, cookie: cookieAfter(second) })
      .expect(204);
    const lines = [first, second, refused, out].flatMap((answer) => {
      const set: unknown = answer.get('set-cookie');
      return Array.isArray(set) ? set.map(String) : [];
    });
    expect(lines).toHaveLength(3 + 2 + 2 + 2);
    expect(lines.flatMap((line) => cookieComplaints(line, { secure, port }))).toEqual([]);
    for (const value of cookie.split('; ').map((pair) => pair.split('=')[1] ?? '')) {
      expect(value.length).toBeGreaterThan(20);
      expect(first.text).not.toContain(value);
    }
  });

  it('the walk sees each header that is missing or other', async () => {
    const good = (await agent().get('/api/health').expect(200)).headers as Headers;
    const names = ['content-security-policy', 'x-content-type-options', 'referrer-policy', 'x-frame-options'];
    for (const name of [...names, 'cache-control', ...(secure ? ['strict-transport-security'] : [])]) {
      expect(headerComplaints(without(good, name), { secure, api: true })).not.toEqual([]);
    }
    const loose = String(good['content-security-policy']).replace(
      "script-src 'self'",
      "script-src 'self' 'unsafe-inline'",
    );
    for (const more of [{ 'content-security-policy': loose }, { 'access-control-allow-origin': EVIL }])
      expect(headerComplaints({ ...good, ...more }, { secure, api: true })).toHaveLength(1);
  });
});

const LINE = '__Host-wetside-access=x; Max-Age=900; Path=/; HttpOnly; Secure; SameSite=Lax';
const said = (text: string) => cookieComplaints(text, { secure: true, port: '' });

describe('the walk sees in a cookie', () => {
  it.each([
    ['a script’s reach', LINE.replace('; HttpOnly', '')],
    ['plain http', LINE.replace('; Secure', '')],
    ['other sites', LINE.replace('SameSite=Lax', 'SameSite=None')],
    ['no word on other sites', LINE.replace('; SameSite=Lax', '')],
    ['a domain', `${LINE}; Domain=darkroom.example`],
    ['another path', LINE.replace('Path=/', 'Path=/api')],
    ['another name', LINE.replace('__Host-', '')],
  ])('%s', (_, broken) => {
    expect(said(broken)).toHaveLength(1);
  });
});

it('a right cookie is not complained of', () => {
  expect(said(LINE)).toEqual([]);
});
