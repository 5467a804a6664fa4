import { expect, type Locator, type Page, test } from '@playwright/test';
import { addDays, showDate } from '@wetside/chemistry';
import { button, needed, seeNeeds, strip, taken } from '../support/steps.js';
import { FIXER, onShelf, place, type Scene, WETTING } from '../support/thread-scene.js';

const { manager: noor } = place.cast;

const ordered = (page: Page, pack: string): Locator =>
  page.getByRole('list', { name: 'Ordered' }).getByRole('listitem').filter({ hasText: pack });

async function receive(page: Page, came: Record<string, [count: string, lot: string]>): Promise<void> {
  for (const [pack, [count, lot]] of Object.entries(came)) {
    const row = page.getByRole('group', { name: pack });
    await row.getByLabel('How many came').fill(count);
    await row.getByLabel('Lot number').fill(lot);
  }
  await taken(page, 'receipts', () => button(page, 'Receive these packs').click());
}

/** The part of the thread that buys: from the warning about the shelf to the packs that came. */
export function orderTests(scene: () => Scene): void {
  test('from the warning the technician drafts the order', async () => {
    const { technician } = scene();
    await needed(technician, `${FIXER}: 1 on the shelf`)
      .getByRole('link', { name: `Order ${FIXER}` })
      .click();
    await taken(technician, 'order-drafts', () =>
      button(technician, 'Draft an order of 2 lines at Low Quay Supplies').click(),
    );
    await expect(technician.getByRole('heading', { name: 'Order 0001, Low Quay Supplies' })).toBeVisible();
    await technician.getByLabel(`Count of ${FIXER}`).fill('3');
    await button(technician, 'Save draft').click();
    await expect(technician.getByText('3 x LQ 17 rapid fixer, litre')).toBeVisible();
    await expect(technician.getByText('A manager sends it.')).toBeVisible();
    await expect(button(technician, 'Send the order')).toHaveCount(0);
  });

  test('the manager sends it, and the supplier has it by mail', async () => {
    const { world, manager } = scene();
    await manager.getByRole('link', { name: 'More' }).click();
    await manager.getByRole('link', { name: 'Orders' }).click();
    await manager.getByRole('link', { name: 'Drafts 1' }).click();
    await manager.getByRole('link', { name: 'Order 0001, Low Quay Supplies' }).click();
    await button(manager, 'Send the order').click();
    await taken(manager, 'order-sendings', () => button(manager, /^Send \d+ packs?$/).click());
    await expect(strip(manager)).toContainText('Order 0001 is on its way to orders@lowquay.example.');
    const [mail] = await world.mailed('Order 0001 from Rope Walk Darkroom', ['orders@lowquay.example']);
    expect(mail?.text).toContain('3 x LQ 17 rapid fixer, litre');
    expect(mail?.text).toContain('2 x LQ 40 wetting agent');
    expect(mail?.text).toContain(`Please answer to ${noor.name}, ${noor.email}, and name order 0001.`);
    expect(mail?.headers['reply-to']).toContain(noor.email);
  });

  test('what is on order counts, and ends the warning', async () => {
    const { world, technician } = scene();
    await seeNeeds(technician, world.at('needs-you'));
    await expect(needed(technician, FIXER)).toHaveCount(0);
    // None stands there still; that it is on its way needs nobody to order it again.
    await expect(needed(technician, `${WETTING}: none on the shelf`)).toContainText('2 on order');
    await technician.goto(world.at('shelf'));
    await expect(onShelf(technician, FIXER)).toContainText('1 on the shelf, 3 on order, reorder at 1');
  });

  test('the order is received in part, then whole, and what is out is noted', async () => {
    const { world, technician, today } = scene();
    await technician.goto(world.at('orders?show=on-the-way'));
    await technician.getByRole('link', { name: 'Order 0001, Low Quay Supplies' }).click();
    await receive(technician, { [FIXER]: ['2', 'L-2304'], [WETTING]: ['0', ''] });
    await expect(ordered(technician, FIXER)).toContainText('2 of 3 received');
    await expect(ordered(technician, WETTING)).toContainText('0 of 2 received');

    const until = addDays(today, 42);
    await technician.getByLabel(`${WETTING}: out until`).fill(until);
    await taken(technician, 'setting-changes', () => button(technician, `Note it for ${WETTING}`).click());
    await expect(strip(technician)).toContainText(`${WETTING} is noted as out.`);
    await technician.goto(world.at('orders?show=suppliers'));
    await expect(technician.getByText(`out until ${showDate(until, today)}`)).toBeVisible();

    await technician.goto(world.at('orders?show=on-the-way'));
    await technician.getByRole('link', { name: 'Order 0001, Low Quay Supplies' }).click();
    await receive(technician, { [FIXER]: ['1', 'L-2304'], [WETTING]: ['2', '771'] });
    await expect(technician.getByText('Nothing more is to come.')).toBeVisible();
    await technician.getByRole('link', { name: 'Shelf' }).click();
    await expect(onShelf(technician, FIXER)).toContainText('4 on the shelf, reorder at 1');
    await expect(onShelf(technician, WETTING)).toContainText('2 on the shelf, reorder at 1');
  });
}
