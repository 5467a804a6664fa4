import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

/** Gathers what the browser complains about: errors on the console, exceptions, blocked by the policy. */
export class Complaints {
  private list: string[] = [];

  constructor(page: Page) {
    page.on('pageerror', (error) => this.list.push(`exception: ${error.message}`));
    page.on('console', (message) => {
      if (message.type() === 'error') this.list.push(`console: ${message.text()}`);
    });
  }

  /** What has gathered since the last time, less the answers that the page is meant to get (a 404 on the page of something that is not there). */
  take(meant: readonly number[] = []): string[] {
    const taken = this.list;
    this.list = [];
    return taken.filter(
      (text) => !meant.some((status) => text.includes(`responded with a status of ${status}`)),
    );
  }
}

/** Elements that stick out at the right, for whoever has to find them. */
const wide = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const root = document.scrollingElement ?? document.documentElement;
    if (root.scrollWidth <= window.innerWidth) return [];
    const out = [...document.querySelectorAll('body *')].filter(
      (element) => element.getBoundingClientRect().right > window.innerWidth + 0.5,
    );
    return [
      `${root.scrollWidth} px wide`,
      ...out.slice(-3).map((element) => element.outerHTML.slice(0, 160)),
    ];
  });

/** A page as it stands: nothing that axe objects to, and nothing to scroll sideways. */
export async function isSound(page: Page): Promise<void> {
  expect
    .soft(await wide(page), `${page.url()} scrolls sideways at ${page.viewportSize()?.width} px`)
    .toEqual([]);
  const { violations } = await new AxeBuilder({ page })
    // One document without frames: no second page has to be opened for the report.
    .setLegacyMode()
    .options({ resultTypes: ['violations'] })
    .analyze();
  const words = violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')} ${node.html.slice(0, 160)}`),
  );
  expect.soft(words, `${page.url()} for axe at ${page.viewportSize()?.width} px`).toEqual([]);
}
