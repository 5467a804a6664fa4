import { expect, type Page, test } from '@playwright/test';
import { fillDarkroom } from '../support/deeds.js';
import type { Place, RoleName } from '../support/people.js';
import { bath, button, sheet } from '../support/steps.js';
import { Complaints, isSound } from '../support/walk.js';
import { desk, phone, World } from '../support/world.js';

/**
 * 200 letters without a space, the hardest to wrap: some written from right to left, some joined without a width, and
 * signs of more than one unit.
 */
const long = (word: string): string => `${'מרים🎞️\u200b'.repeat(3)}${word.repeat(200)}`.slice(0, 200);
const FIXER = 'Rapid fixer concentrate, 1 L';

const place: Place = {
  shortName: 'long-names',
  name: long('Lichtbildkammer'),
  zone: 'Europe/Dublin',
  cast: {
    member: { name: long('Margarethe'), email: 'member@longnames.example' },
    technician: { name: long('Thorvaldur'), email: 'technician@longnames.example' },
    manager: { name: long('Maximiliane'), email: 'manager@longnames.example' },
  },
  suppliers: [
    {
      name: long('Chemikalienhandel'),
      email: `${'orders'.repeat(10)}@chemikalienhandel.example`,
      packs: [{ pack: FIXER, supplierName: long('Fixierbadkonzentrat'), priceMinor: 1_150 }],
    },
  ],
};

interface Stop {
  path: string;
  /** What stands there once the page is whole, at any role that may see it. */
  heading: RegExp;
  least?: RoleName;
  /** Answers that the page is meant to get. */
  meant?: number[];
}

/** The one page for those whose role does not reach: all of them look like it. */
const notAllowed = / (is|are) for technicians\.$/;
const rank: Record<RoleName, number> = { member: 0, technician: 1, manager: 2 };

test.describe('every page, for every role, on a phone and on a desk', { tag: '@core' }, () => {
  let world: World;
  const pages = {} as Record<RoleName, Page>;
  const complaints = {} as Record<RoleName, Complaints>;
  let stops: Stop[];

  test.beforeAll(async ({ browser }) => {
    world = await World.make(place);
    await world.asAdmin(async (sql) => {
      await sql`update packs set name = ${long('Schnellfixierer')} where name = ${FIXER}`;
    });
    for (const role of ['member', 'technician', 'manager'] as const) {
      pages[role] = await world.open(browser, { viewport: phone, reducedMotion: 'reduce' });
      complaints[role] = new Complaints(pages[role]);
      await world.signIn(pages[role], role);
      complaints[role].take([401]);
    }
    const { draftId, sentId } = await fillDarkroom(world, pages);
    stops = [
      { path: 'sink', heading: /^Sink$/ },
      { path: 'bottles/FX-01', heading: /^FX-01/ },
      { path: 'bottles/FX-02', heading: /^FX-02/ },
      { path: 'bottles/SB-01', heading: /^SB-01/ },
      { path: 'bottles/XX-99', heading: /^There is no such bottle here/, meant: [404] },
      { path: 'nowhere', heading: /^There is no such page here/ },
      { path: 'more', heading: /./ },
      { path: 'mixing', heading: /^(Mixing|Chemistries)$/ },
      { path: 'log', heading: /^Log$/ },
      { path: 'mixing/new', heading: /^Record a mix$/, least: 'technician' },
      { path: 'needs-you', heading: /^Needs you$/, least: 'technician' },
      { path: 'shelf', heading: /^Shelf$/, least: 'technician' },
      { path: 'shelf/receive', heading: /^Receive by hand$/, least: 'technician' },
      { path: 'orders', heading: /^Orders$/, least: 'technician' },
      { path: 'orders?show=drafts', heading: /^Orders$/, least: 'technician' },
      { path: 'orders?show=on-the-way', heading: /^Orders$/, least: 'technician' },
      { path: 'orders?show=closed', heading: /^Orders$/, least: 'technician' },
      { path: 'orders?show=suppliers', heading: /^Orders$/, least: 'technician' },
      { path: `orders/${draftId}`, heading: /^Order 0002/, least: 'technician' },
      { path: `orders/${sentId}`, heading: /^Order 0001/, least: 'technician' },
    ];
  });
  test.afterAll(() => world.end());

  /** Both widths of what stands on the page now. */
  async function look(page: Page): Promise<void> {
    for (const size of [desk, phone]) {
      await page.setViewportSize(size);
      await isSound(page);
    }
  }

  async function arrive(page: Page, path: string, heading: RegExp): Promise<void> {
    await page.goto(world.at(path));
    await expect(page.getByRole('heading', { level: 1, name: heading })).toBeVisible();
    await expect(page.locator('[aria-busy=true]')).toHaveCount(0);
  }

  for (const role of ['member', 'technician', 'manager'] as const) {
    test(`the pages of a ${role}`, async () => {
      test.setTimeout(180_000);
      const page = pages[role];
      for (const { path, heading, least = 'member', meant } of stops) {
        if (rank[role] < rank[least]) await arrive(page, path, notAllowed);
        else {
          await arrive(page, path, heading);
          await look(page);
        }
        expect.soft(complaints[role].take(meant), path).toEqual([]);
      }
    });
  }

  test('being told whom to ask', async () => {
    await arrive(pages.member, 'mixing/new', notAllowed);
    await expect(pages.member.getByText(/^Ask /)).toBeVisible();
    await look(pages.member);
    expect.soft(complaints.member.take()).toEqual([]);
  });

  test('the sheets', async () => {
    test.setTimeout(120_000);
    const page = pages.technician;
    await arrive(page, 'sink', /^Sink$/);
    await button(page, 'Put a load through').click();
    await expect(sheet(page).getByLabel('How many')).toBeVisible();
    await look(page);
    await page.keyboard.press('Escape');
    await expect(bath(page, 'FX-03')).toBeVisible();
    for (const doing of ['FX-03?do=hold', 'FX-02?do=release', 'FX-01?do=discard']) {
      await page.goto(world.at(`bottles/${doing}`));
      await expect(sheet(page)).toBeVisible();
      await look(page);
    }
    await arrive(page, 'needs-you', /^Needs you$/);
    await button(page, 'Decide').click();
    await button(sheet(page), 'Accept the load').click();
    await expect(sheet(page)).toContainText('Say why');
    await look(page);
    expect.soft(complaints.technician.take()).toEqual([]);
  });

  test('a name written from right to left does not turn the sentence around it', async () => {
    const page = pages.member;
    await world.asAdmin(async (sql) => {
      await sql`update memberships set display_name = 'מרים' where role = 'member'`;
    });
    await arrive(page, 'log', /^Log$/);
    const row = page.getByRole('listitem').filter({ hasText: 'מרים' }).first();
    const lefts = await row.evaluate((element) => {
      const texts = document.createTreeWalker(element, NodeFilter.SHOW_TEXT);
      const found: number[] = [];
      for (let node = texts.nextNode(); node; node = texts.nextNode()) {
        const text = node.textContent ?? '';
        const at = [text.indexOf('מ'), text.search(/ (put|put back|held|voided|reported) /)].filter(
          (i) => i >= 0,
        );
        for (const from of at) {
          const range = document.createRange();
          range.setStart(node, from);
          range.setEnd(node, from + 3);
          found.push(range.getBoundingClientRect().left);
        }
      }
      return found;
    });
    expect(lefts.length).toBeGreaterThanOrEqual(1);
    expect([...lefts].sort((a, b) => a - b)).toEqual(lefts);
  });

  test('mutant: a script in the page, and a picture from elsewhere, are blocked and complained of', async () => {
    const page = pages.member;
    await arrive(page, 'sink', /^Sink$/);
    complaints.member.take();
    const ran = await page.evaluate(() => {
      const script = document.createElement('script');
      script.textContent = 'window.spilt = true';
      document.body.append(script);
      const picture = new Image();
      picture.src = 'https://elsewhere.example/picture.png';
      document.body.append(picture);
      return 'spilt' in window;
    });
    expect(ran).toBe(false);
    const heard: string[] = [];
    await expect
      .poll(() => {
        heard.push(...complaints.member.take());
        return heard.filter((text) => /Content Security Policy/.test(text)).length;
      })
      .toBeGreaterThanOrEqual(2);
    expect(heard.join('\n')).toMatch(/script-src/);
    expect(heard.join('\n')).toMatch(/img-src/);
  });

  test('signing in, and being told no', async ({ browser }) => {
    const page = await world.open(browser, { viewport: phone, reducedMotion: 'reduce' });
    const heard = new Complaints(page);
    await page.goto(`${world.origin}/sign-in`);
    await button(page, 'Sign in').click();
    await expect(page.getByText('Your e-mail address.')).toBeVisible();
    await look(page);
    await page.getByLabel('E-mail address').fill(place.cast.member.email);
    await page.getByLabel('Passphrase').fill('not the passphrase');
    await button(page, 'Sign in').click();
    await expect(page.getByRole('alert')).toBeVisible();
    await look(page);
    expect.soft(heard.take([401])).toEqual([]);
    await page.context().close();
  });
});
