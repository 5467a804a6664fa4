import { expect, type Page, test } from '@playwright/test';
import { addDays, addMonths, daysBetween, type LocalDate, showDate } from '@wetside/chemistry';
import {
  bath,
  because,
  button,
  needed,
  openLoad,
  putThrough,
  seeNeeds,
  sheet,
  strip,
  taken,
} from '../support/steps.js';
import { CHEMISTRY, FIXER, makeScene, onShelf, place, type Scene, warned } from '../support/thread-scene.js';
import type { World } from '../support/world.js';
import { orderTests } from './thread-orders.js';

/** How far the clock is moved to reach so many days before or after a date. */
const daysTo = (today: LocalDate, date: LocalDate, more: number): string =>
  `P${daysBetween(today, date) + more}D`;

test.describe.configure({ mode: 'serial' });

test.describe('one bottle of fixer, from the shelf to the drain', { tag: '@core' }, () => {
  let scene: Scene;
  let world: World;
  let member: Page;
  let technician: Page;
  let manager: Page;
  let mixedOn: LocalDate;

  test.beforeAll(async ({ browser }) => {
    scene = await makeScene(browser);
    ({ world, member, technician, manager, today: mixedOn } = scene);
  });
  test.afterAll(() => world.end());

  test('everybody signs in and finds an empty sink', async () => {
    await world.signIn(member, 'member');
    await world.signIn(technician, 'technician');
    await world.signIn(manager, 'manager');
    await expect(member.getByText('Nothing stands at the sink yet.')).toBeVisible();
  });

  test('the technician receives two packs by hand', async () => {
    await technician.getByRole('link', { name: 'Shelf' }).click();
    await technician.getByRole('link', { name: 'Receive by hand' }).click();
    await technician.getByLabel('Pack', { exact: true }).selectOption({ label: FIXER });
    await technician.getByLabel('How many came').fill('2');
    await technician.getByLabel('Lot number').fill('L-2219');
    await technician.getByLabel('Expires').fill(addDays(mixedOn, 400));
    await taken(technician, 'receipts', () => button(technician, 'Put on the shelf').click());
    await expect(strip(technician)).toContainText('2 packs are on the shelf.');
    await expect(onShelf(technician, FIXER)).toContainText('2 on the shelf, reorder at 1');
    await expect(onShelf(technician, FIXER)).toContainText('lot L-2219: 2 unopened, expires');
  });

  test('the mix says beforehand what it takes, makes and leaves', async () => {
    await technician.getByRole('link', { name: 'Mixing' }).click();
    await technician.getByRole('combobox', { name: 'What' }).selectOption({ label: CHEMISTRY });
    await expect(technician.getByRole('radio', { name: /^New pack of .*L-2219/ })).toBeChecked();
    await expect(technician.getByLabel('How much')).toHaveValue('1000');
    const preview = technician.getByRole('region', { name: 'What will happen' });
    await expect(preview).toContainText('FX-01');
    // 1+4: one part of five. 20 rolls a litre: Tyrrell, Analogue Photography FAQ, 'Fixer capacity' (second-hand).
    await expect(preview).toContainText('800 mL of tap water');
    await expect(preview).toContainText('200 mL of rapid fixer concentrate');
    // Two months in a full bottle: Anchell, The Darkroom Cookbook, 3rd ed. 2008, p. 108 (published).
    await expect(preview).toContainText(`20 rolls, until ${showDate(addMonths(mixedOn, 2), mixedOn)}`);
    await expect(preview).toContainText('Wear gloves and eye protection');
    await expect(preview).toContainText('1 on the shelf, which is its reorder point (1): order more');
    await expect(preview).toContainText('800 mL in the opened pack');
    await taken(technician, 'mixes', () => button(technician, 'Record FX-01').click());
    await expect(technician.getByRole('heading', { name: `FX-01 ${CHEMISTRY}` })).toBeVisible();
    await expect(technician.getByText(/^20 rolls left, to /)).toBeVisible();
  });

  test('the shelf is one pack short, and is reported to technician and manager once', async () => {
    await technician.getByRole('link', { name: 'Shelf' }).click();
    await expect(onShelf(technician, FIXER)).toContainText('1 on the shelf, reorder at 1');
    await expect(onShelf(technician, FIXER)).toContainText('800 mL left');
    const [mail] = await world.mailed(`${FIXER}: 1 on the shelf, reorder at 1`, warned);
    expect(mail?.text).toContain('What to do: Order it.');
    expect(mail?.text).toContain(world.at('shelf'));
  });

  test('the member ticks two rolls, undoes and ticks again', async () => {
    await member.reload();
    await expect(bath(member, 'FX-01')).toContainText('20 rolls left');
    await button(member, 'Put a load through').tap();
    await button(sheet(member), 'One more').tap();
    await expect(sheet(member)).toContainText('Leaves 18 rolls in FX-01.');
    await taken(member, 'loads', () => button(sheet(member), 'Put 2 rolls through FX-01').tap());
    await expect(strip(member)).toContainText('2 rolls of 135 are in.');
    await expect(bath(member, 'FX-01')).toContainText('18 rolls left');
    await taken(member, 'voids', () => button(strip(member), 'Undo').tap());
    await expect(bath(member, 'FX-01')).toContainText('20 rolls left');
    await putThrough(member, 2, 'Put 2 rolls through FX-01');
    await expect(bath(member, 'FX-01')).toContainText('18 rolls left');
  });

  test('a healthy bottle takes a load in two taps', async () => {
    await member.reload();
    // The count of the load before is remembered: two rolls again are two taps.
    await button(member, 'Put a load through').tap();
    await taken(member, 'loads', () => button(sheet(member), 'Put 2 rolls through FX-01').tap());
    await expect(bath(member, 'FX-01')).toContainText('16 rolls left');
  });

  test('low is mailed once each, however often it is ticked afterwards', async () => {
    await member.reload();
    const left = Number(/(\d+) rolls left/.exec(await bath(member, 'FX-01').innerText())?.[1]);
    await putThrough(member, left - 4, `Put ${left - 4} rolls through FX-01`);
    await expect(bath(member, 'FX-01')).toContainText('4 rolls left');
    await expect(bath(member, 'FX-01')).toContainText('low');
    await world.mailed('FX-01 fixer is running low: 4 rolls left', warned);
    await putThrough(member, 1, 'Put 1 roll through FX-01');
    await expect(bath(member, 'FX-01')).toContainText('3 rolls left');
  });

  test('too much is said before, counted, and kept flagged', async () => {
    const open = await openLoad(member);
    await open.getByLabel('How many').fill('5');
    await expect(open).toContainText('FX-01 has 3 rolls left, this is 5: 2 over');
    await taken(member, 'loads', () => button(open, 'Put 5 through, 2 over').click());
    await expect(bath(member, 'FX-01')).toContainText('Spent: 22 of 20 rolls used, 2 over');
    await world.mailed('FX-01 fixer is spent', warned);
    // Both were told it was low once, and only once: the load after it said nothing new.
    await world.mailed('FX-01 fixer is running low', warned);
  });

  test('through a spent bottle a load is only reported, and shows in the bottle’s own row', async () => {
    const open = await openLoad(member);
    await expect(open.getByRole('button', { name: /^Put/ })).toHaveCount(0);
    // The sheet remembers the five of the load before.
    await open.getByLabel('How many').fill('1');
    await button(open, 'It has been through FX-01 already').click();
    await taken(member, 'loads', () => button(open, 'Report 1 roll through FX-01').click());
    await expect(strip(member)).toContainText('1 roll of 135 is reported.');
    await expect(bath(member, 'FX-01')).toContainText('Spent: 23 of 20 rolls used, 3 over');
    await bath(member, 'FX-01').getByRole('link', { name: 'All about FX-01' }).click();
    const happened = member.getByRole('list', { name: 'What happened' }).getByRole('listitem');
    await expect(happened.first()).toContainText('1 roll of 135');
    await expect(happened.first()).toContainText('over its capacity');
    await expect(happened.nth(1)).toContainText('over its capacity');
    await seeNeeds(technician, world.at('needs-you'));
    await expect(needed(technician, 'FX-01 fixer is spent')).toContainText('Mailed to 2');
    await expect(button(technician, 'Decide')).toHaveCount(0);
  });

  test('the second mix comes from the opened pack', async () => {
    await technician.getByRole('link', { name: 'Mixing' }).click();
    await technician.getByRole('combobox', { name: 'What' }).selectOption({ label: CHEMISTRY });
    await expect(technician.getByRole('radio', { name: /^Opened pack of .*800 mL left/ })).toBeChecked();
    await technician.getByLabel('How much').fill('2000');
    await technician.getByLabel('Size of it').fill('2000');
    const preview = technician.getByRole('region', { name: 'What will happen' });
    await expect(preview).toContainText('40 rolls');
    await expect(preview).toContainText('400 mL in the opened pack');
    await taken(technician, 'mixes', () => button(technician, 'Record FX-02').click());
    await expect(technician.getByRole('heading', { name: `FX-02 ${CHEMISTRY}` })).toBeVisible();
    await technician.getByRole('link', { name: 'Shelf' }).click();
    await expect(onShelf(technician, FIXER)).toContainText('400 mL left');
    await expect(onShelf(technician, FIXER)).toContainText('1 on the shelf');
  });

  test('the spent bottle is discarded from the list of what needs the technician', async () => {
    await seeNeeds(technician, world.at('needs-you'));
    await needed(technician, 'FX-01 fixer is spent').getByRole('link', { name: 'Discard FX-01' }).click();
    await expect(sheet(technician)).toContainText('It holds silver.');
    await taken(technician, 'discards', () => button(sheet(technician), 'Discard FX-01').click());
    await seeNeeds(technician, world.at('needs-you'));
    await expect(needed(technician, 'FX-01')).toHaveCount(0);
  });

  test('a held bottle takes no load but a reported one, which the technician decides', async () => {
    await member.goto(world.at('bottles/FX-02'));
    await button(member, 'Hold').click();
    await button(sheet(member), 'smells wrong').click();
    await taken(member, 'holds', () => button(sheet(member), 'Put FX-02 on hold').click());
    await expect(member.getByText('On hold by Mara Lind: smells wrong').first()).toBeVisible();
    await world.mailed('FX-02 fixer is on hold by Mara Lind: smells wrong', warned);
    await expect(button(member, 'Release')).toHaveCount(0);
    await button(member, 'It has been through FX-02 already').click();
    await taken(member, 'loads', () => button(sheet(member), 'Report 1 roll through FX-02').click());
    await world.mailed('A load went through FX-02 while it was on hold', warned);

    await technician.reload();
    const row = needed(technician, 'A load went through FX-02 while it was on hold');
    await expect(row).toContainText('by Mara Lind');
    await button(row, 'Decide').click();
    await because(technician, 'decisions', 'the bath was sound', 'Accept the load');
    await expect(row).toHaveCount(0);
    await needed(technician, 'FX-02 fixer is on hold').getByRole('link', { name: 'Release FX-02' }).click();
    await because(technician, 'releases', 'pH 5.2, nothing wrong with it', 'Release FX-02');
    await expect(technician.getByText(/^39 rolls left, to /)).toBeVisible();
    await seeNeeds(technician, world.at('needs-you'));
    await expect(needed(technician, 'FX-02')).toHaveCount(0);
  });

  orderTests(() => scene);

  test('the log says who did what, newest first, and strikes through what was taken back', async () => {
    await technician.goto(world.at('log'));
    const rows = technician.getByRole('list', { name: 'What happened' }).getByRole('listitem');
    await expect(rows.first()).toContainText(`Pavel Roth: received 1 × ${FIXER}, lot L-2304`);
    const order = [
      'received 1',
      'sent order 0001',
      'drafted order 0001',
      'released',
      'mixed 2 L',
      'mixed 1 L',
      'lot L-2219',
    ];
    const texts = await rows.allInnerTexts();
    const places = order.map((words) => texts.findIndex((text) => text.includes(words)));
    expect(places).not.toContain(-1);
    expect(places).toEqual([...places].sort((a, b) => a - b));
    await expect(rows.filter({ hasText: 'sent order 0001' })).toContainText('Noor Adler');
    const struck = rows.filter({ hasText: '↳ voided' });
    await expect(struck).toHaveCount(1);
    await expect(struck.getByText('Mara Lind: 2 rolls of 135')).toHaveCSS(
      'text-decoration-line',
      'line-through',
    );
  });

  test('six days before its date the bottle is near it', async () => {
    await world.moveClock(daysTo(mixedOn, addMonths(mixedOn, 2), -6));
    await world.mailed('FX-02 fixer is near its date: it keeps to', warned);
    await world.signIn(technician, 'technician');
    await expect(bath(technician, 'FX-02')).toContainText('near its date');
  });

  test('past its date it is closed, and discarding it ends the warning', async () => {
    await world.moveClock(daysTo(mixedOn, addMonths(mixedOn, 2), 2));
    await world.mailed('FX-02 fixer is past its date since', warned);
    await world.signIn(technician, 'technician');
    await expect(bath(technician, 'FX-02')).toContainText('Past its date since');
    await seeNeeds(technician, world.at('needs-you'));
    await needed(technician, 'FX-02 fixer is past its date')
      .getByRole('link', { name: 'Discard FX-02' })
      .click();
    await taken(technician, 'discards', () => button(sheet(technician), 'Discard FX-02').click());
    await seeNeeds(technician, world.at('needs-you'));
    await expect(needed(technician, 'FX-02')).toHaveCount(0);
    expect(await world.mails('FX-02 fixer is near its date')).toHaveLength(warned.length);
  });

  test('nobody had a mail twice, and no warning went to the member', async () => {
    const mails = (await world.mails('')).map(({ envelope, subject }) => `${envelope.to.join()} ${subject}`);
    expect(mails.filter((mail) => mail.includes(place.cast.member.email))).toEqual([]);
    expect([...new Set(mails)]).toEqual(mails);
  });
});
