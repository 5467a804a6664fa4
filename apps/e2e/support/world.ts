import type { Browser, BrowserContextOptions, Page } from '@playwright/test';
import { expect } from '@playwright/test';
import { type LocalDate, localDate } from '@wetside/chemistry';
import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import { type CaughtMail, type MailCatcher, startMailCatcher } from '@wetside/mail-catcher';
import { asAdmin, furnish, passphrase, type Place, type RoleName } from './people.js';
import { freePort, type Server, type Settings, settingsFor, startServer } from './program.js';

/** The smallest phone that is designed for. */
export const phone = { width: 390, height: 664 };
export const desk = { width: 1280, height: 800 };

/** A database, a mail catcher, a server and a darkroom of one journey's own. */
export class World {
  private constructor(
    readonly place: Place,
    readonly origin: string,
    private readonly database: TestDatabase,
    private readonly catcher: MailCatcher,
    private readonly settings: Settings,
    private server: Server,
  ) {}

  static async make(place: Place, settings: Settings = {}): Promise<World> {
    const [database, catcher, port] = await Promise.all([
      cloneDatabase(),
      startMailCatcher({ smtpPort: 0, httpPort: 0 }),
      freePort(),
    ]);
    const all = settingsFor(port, catcher.smtpPort, database, settings);
    await furnish(place, all, database.adminUrl);
    return new World(place, `http://localhost:${port}`, database, catcher, all, await startServer(all));
  }

  /** Ends the server and starts it again that far in the future: 'P56D'. */
  async moveClock(offset: string): Promise<void> {
    await this.server.stop();
    expect(this.server.errors()).toBe('');
    this.server = await startServer({ ...this.settings, CLOCK_OFFSET: offset });
  }

  /** The darkroom's present date by the server's clock. */
  async today(): Promise<LocalDate> {
    const answer = await fetch(`${this.origin}/api/health`);
    return localDate(answer.headers.get('x-wetside-now') ?? '', this.place.zone);
  }

  asAdmin(work: Parameters<typeof asAdmin>[1]): Promise<void> {
    return asAdmin(this.database.adminUrl, work);
  }

  /** The address of a page of the darkroom: 'sink', 'bottles/FX-01'. */
  at(path: string): string {
    return `${this.origin}/d/${this.place.shortName}/${path}`;
  }

  /** A browser of that person's own, not signed in yet. */
  async open(
    browser: Browser,
    options: BrowserContextOptions = { viewport: phone, hasTouch: true },
  ): Promise<Page> {
    const context = await browser.newContext(options);
    return context.newPage();
  }

  /** Signs in by the form and waits for the sink. */
  async signIn(page: Page, role: RoleName): Promise<void> {
    // A sign-in that still holds would be renewed and lead away from the form while it is filled in.
    await page.context().clearCookies();
    await page.goto(`${this.origin}/sign-in`);
    await page.getByLabel('E-mail address').fill(this.place.cast[role].email);
    await page.getByLabel('Passphrase').fill(passphrase);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await expect(page.getByRole('heading', { name: 'Sink', level: 1 })).toBeVisible();
  }

  /** The mails with these words in their subject, read from the catcher as its page gives them. */
  async mails(subject: string): Promise<CaughtMail[]> {
    const url = new URL(`http://127.0.0.1:${this.catcher.httpPort}/messages`);
    url.searchParams.set('subject', subject);
    const answer = await fetch(url);
    expect(answer.ok).toBe(true);
    return (await answer.json()) as CaughtMail[];
  }

  /** Waits until those people have had a mail of that subject, each of them exactly one, and nobody else any. */
  async mailed(subject: string, to: readonly string[]): Promise<CaughtMail[]> {
    const receivers = async (): Promise<string[]> =>
      (await this.mails(subject)).flatMap((mail) => mail.envelope.to).sort();
    await expect.poll(receivers, { message: `mail “${subject}”`, timeout: 15_000 }).toEqual([...to].sort());
    return this.mails(subject);
  }

  async end(): Promise<void> {
    await this.server.stop();
    const errors = this.server.errors();
    await this.catcher.close();
    await this.database.drop();
    expect(errors, 'what the server logged as errors').toBe('');
  }
}
