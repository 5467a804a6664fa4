import { expect, type Page, test } from '@playwright/test';
import { fillDarkroom } from '../support/deeds.js';
import type { Place } from '../support/people.js';
import { bath, button, openLoad, strip, taken } from '../support/steps.js';
import { desk, phone, World } from '../support/world.js';

const FIXER = 'Rapid fixer concentrate, 1 L';
const place: Place = {
  shortName: 'two-hands',
  name: 'Two Hands',
  zone: 'Europe/Dublin',
  cast: {
    member: { name: 'Ines', email: 'ines@twohands.example' },
    technician: { name: 'Tomas', email: 'tomas@twohands.example' },
    manager: { name: 'Mara', email: 'mara@twohands.example' },
  },
  suppliers: [
    {
      name: 'Low Quay Supplies',
      email: 'orders@lowquay.example',
      packs: [{ pack: FIXER, supplierName: 'LQ 17', priceMinor: 1_150 }],
    },
  ],
};

/** The strip that says what was done lies over the heading: no row of the sink moves when it comes or goes. */
async function nothingMoves(page: Page, sink: string): Promise<void> {
  await page.goto(sink);
  const row = bath(page, 'FX-03');
  await expect(row).toBeVisible();
  const before = await row.boundingBox();
  const open = await openLoad(page);
  await taken(page, 'loads', () => button(open, /^Put 1 roll/).click());
  await expect(open).toBeHidden();
  await expect(button(strip(page), 'Undo')).toBeVisible();
  expect((await row.boundingBox())?.y).toBe(before?.y);
  for (const size of [phone, desk]) {
    await page.setViewportSize(size);
    await page.screenshot({ path: test.info().outputPath(`strip-${size.width}.png`) });
  }
  await page.setViewportSize(phone);
  await button(strip(page), 'Close').click();
  expect((await row.boundingBox())?.y).toBe(before?.y);
}

test('two people edit one draft: the second is told, nothing is lost; more comes than was ordered', async ({
  browser,
}) => {
  test.setTimeout(120_000);
  const world = await World.make(place);
  try {
    const [member, technician, manager] = [
      await world.open(browser),
      await world.open(browser, { viewport: phone }),
      await world.open(browser, { viewport: desk }),
    ];
    await world.signIn(member, 'member');
    await world.signIn(technician, 'technician');
    await world.signIn(manager, 'manager');
    const { draftId, sentId } = await fillDarkroom(world, { member, technician, manager });

    await nothingMoves(member, world.at('sink'));
    for (const page of [technician, manager]) await page.goto(world.at(`orders/${draftId}`));
    const count = (page: typeof manager) => page.getByRole('textbox', { name: `Count of ${FIXER}` });
    const note = (page: typeof manager) => page.getByLabel('Note to the supplier');
    await count(technician).fill('7');
    await note(manager).fill('ring twice');
    const saved = manager.waitForResponse((response) => response.request().method() === 'PATCH');
    await button(manager, 'Save draft').click();
    expect((await saved).ok()).toBe(true);

    await button(technician, 'Save draft').click();
    await expect(technician.getByText(/^Somebody else has saved this draft meanwhile\./)).toBeVisible();
    await expect(count(technician)).toHaveValue('7');
    await technician.screenshot({ path: test.info().outputPath('draft-changed.png'), fullPage: true });
    await button(technician, 'Go on with mine').click();
    await expect(note(technician)).toHaveValue('ring twice');
    await button(technician, 'Save draft').click();
    await expect(technician.getByText('Total EUR 80.50')).toBeVisible();
    await manager.reload();
    await expect(count(manager)).toHaveValue('7');
    await expect(note(manager)).toHaveValue('ring twice');

    await technician.goto(world.at(`orders/${sentId}`));
    await technician.getByLabel('How many came').fill('5');
    await technician.getByLabel('Lot number').fill('L-7');
    await button(technician, 'Receive these packs').click();
    await expect(technician.getByText('More than is open on the order.')).toBeVisible();
    await technician.getByLabel('More came than was ordered, and it is kept.').check();
    await technician.screenshot({ path: test.info().outputPath('more-came.png'), fullPage: true });
    await taken(technician, 'receipts', () => button(technician, 'Receive these packs').click());
    await expect(strip(technician)).toContainText('5 packs are on the shelf.');
    await expect(technician.getByText('5 of 2 received')).toBeVisible();
  } finally {
    await world.end();
  }
});
