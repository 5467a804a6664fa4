import { memberships } from '@wetside/db';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { TestApp, type Browser, type TestPerson } from '../../testing/test-app.js';
import { DarkroomNewService } from './darkroom-new.service.js';

let t: TestApp;
let ada: TestPerson;
let bo: TestPerson;
let riverside: string;
let adas: Browser;
let bos: Browser;

beforeAll(async () => {
  t = await TestApp.start();
  ada = await t.person('Ada');
  bo = await t.person('Bo');
  riverside = await t.darkroom('riverside', ada, { currency: 'GBP', smallestTankUl: 300_000 });
  await t.darkroom('hillside', bo);
  adas = await t.signedIn(ada);
  bos = await t.signedIn(bo);
});
afterAll(() => t.close());

describe('a darkroom', () => {
  it.each([
    ['its id', () => riverside],
    ['its short name', () => 'riverside'],
  ])('is found by %s', async (_, address) => {
    const { body } = await adas.get(`/api/darkrooms/${address()}`).expect(200);
    expect(body).toEqual({
      id: riverside,
      shortName: 'riverside',
      name: 'The riverside darkroom',
      zone: 'Europe/Vienna',
      units: { temperature: 'C', volume: 'mL' },
      currency: 'GBP',
      thresholds: {
        lowShareE4: 2000,
        lowRollsE4: 30_000,
        nearDaysMax: 7,
        nearShareE4: 2500,
        smallestTankUl: 300_000,
      },
      me: { membershipId: expect.any(String), role: 'manager', displayName: 'Ada' },
    });
  });

  it('is not there for a stranger, just like one that is not', async () => {
    const answers = [];
    for (const address of [riverside, 'riverside', v7(), 'nowhere']) {
      answers.push((await bos.get(`/api/darkrooms/${address}`).expect(404)).body);
    }
    expect(new Set(answers.map((body) => JSON.stringify(body))).size).toBe(1);
    await t.browser().get(`/api/darkrooms/${riverside}`).expect(401);
  });

  it('shows its people without their addresses', async () => {
    const cy = await t.person('Cy');
    await t.join(riverside, cy, 'technician');
    const { body, text } = await adas.get(`/api/darkrooms/${riverside}/people`).expect(200);
    expect(body).toMatchObject([
      { displayName: 'Ada', role: 'manager' },
      { displayName: 'Cy', role: 'technician' },
    ]);
    expect(text).not.toContain('@');
    await bos.get(`/api/darkrooms/${riverside}/people`).expect(404);
  });

  it('is closed at once to whoever leaves', async () => {
    const di = await t.person('Di');
    const id = await t.join(riverside, di, 'member');
    const dis = await t.signedIn(di);
    await dis.get('/api/darkrooms/riverside').expect(200);
    await t.database.inDarkroom({ darkroomId: riverside }, (tx) =>
      tx.update(memberships).set({ leftAt: t.clock.now() }).where(eq(memberships.id, id)),
    );
    await dis.get('/api/darkrooms/riverside').expect(404);
    expect((await dis.get('/api/me').expect(200)).body.darkrooms).toEqual([]);
  });
});

describe('opening a darkroom', () => {
  const order = (shortName: string, email: string) => ({
    name: 'Harbour',
    shortName,
    zone: 'Europe/Lisbon',
    email,
    personName: 'Eli',
  });
  const open = (shortName: string, email: string) =>
    t.app
      .get(DarkroomNewService)
      .open(order(shortName, email), () => Promise.resolve('a passphrase for the harbour'));

  it('makes the manager’s account, and for one who is known only the membership', async () => {
    await open('harbour', 'Eli@darkroom.example');
    await t.app.get(DarkroomNewService).open(order('harbour-two', 'eli@darkroom.example'), () => {
      throw new Error('Nobody is to be asked.');
    });
    const { body } = await t
      .browser()
      .post('/api/sign-in')
      .send({ email: 'eli@darkroom.example', passphrase: 'a passphrase for the harbour' })
      .expect(200);
    expect(body.darkrooms.map(({ shortName }: { shortName: string }) => shortName)).toEqual([
      'harbour',
      'harbour-two',
    ]);
  });

  it.each([
    ['riverside', 'short-name-taken'],
    ['River Side', 'short-name-shape'],
  ])('refuses the short name %p and leaves nobody behind', async (shortName, code) => {
    const email = `${code}@darkroom.example`;
    await expect(open(shortName, email)).rejects.toMatchObject({ code });
    await expect(t.app.get(DarkroomNewService).knownPerson(email)).resolves.toBeNull();
  });
});
