import { expect, type Locator, type Page } from '@playwright/test';

/** Does something that sends an action, and waits until the server has taken it. */
export async function taken(page: Page, plural: string, deed: () => Promise<void>): Promise<void> {
  const answer = page.waitForResponse(
    (response) => response.request().method() === 'PUT' && response.url().includes(`/${plural}/`),
  );
  await deed();
  const got = await answer;
  expect(got.ok(), `${plural}: ${got.status()} ${got.ok() ? '' : await got.text()}`).toBe(true);
}

export const button = (within: Page | Locator, name: string | RegExp): Locator =>
  within.getByRole('button', { name, exact: true });

/** The strip that says what was just done. */
export const strip = (page: Page): Locator => page.getByRole('status', { name: 'What was just done' });

/** A bottle at the sink. */
export const bath = (page: Page, code: string): Locator =>
  page.getByRole('list', { name: 'Bottles in use' }).getByRole('listitem').filter({ hasText: code });

/** The sheet of something being done. */
export const sheet = (page: Page): Locator => page.getByRole('dialog');

/** A row of the list of what needs somebody. */
export const needed = (page: Page, words: string): Locator =>
  page.getByRole('list', { name: 'Needs you' }).getByRole('listitem').filter({ hasText: words });

/** Opens the list of what needs somebody and waits for it: an absent row proves nothing before. */
export async function seeNeeds(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await expect(page.getByText(/^(Nothing needs you|\d+ things? needs? you)\.$/).first()).toBeVisible();
}

/** Opens the load sheet by the foot button. Just after a load it is deaf for a moment, on purpose: it is asked again. */
export async function openLoad(page: Page): Promise<Locator> {
  await expect(async () => {
    if (!(await sheet(page).isVisible())) await button(page, 'Put a load through').click({ timeout: 500 });
    await expect(sheet(page)).toBeVisible({ timeout: 500 });
  }).toPass({ timeout: 10_000 });
  return sheet(page);
}

/** Puts so many rolls of 135 through all baths, from the sink. */
export async function putThrough(page: Page, count: number, words: string): Promise<void> {
  const open = await openLoad(page);
  await open.getByLabel('How many').fill(String(count));
  await taken(page, 'loads', () => button(open, words).click());
  await expect(open).toBeHidden();
}

/** Writes the reason that a sheet asks for and confirms. */
export async function because(page: Page, plural: string, reason: string, name: string): Promise<void> {
  await sheet(page).getByRole('textbox').fill(reason);
  await taken(page, plural, () => button(sheet(page), name).click());
  await expect(sheet(page)).toBeHidden();
}
