import { v7 } from 'uuid';
import { PASSPHRASE } from './house.js';

/** A load, and whether the server said that it counts. */
export interface Sent {
  id: string;
  bottleIds: string[];
  body: string;
  answered: boolean;
}

/** How one try went: the status, or null when no answer came. */
export type Outcome = number | null;

/** Longer than any limit of the server's: who waits longer has been forgotten. */
const PATIENCE_MS = 45_000;

/** One person who puts film through bottles, again and again, and keeps what was sent. */
export class Ticker {
  readonly sent: Sent[] = [];
  private cookie = '';

  constructor(
    private readonly url: string,
    private readonly darkroomId: string,
    private readonly email: string,
    private readonly now: () => Date,
  ) {}

  async signIn(): Promise<void> {
    const answer = await this.fetch('POST', '/api/sign-in', {
      email: this.email,
      passphrase: PASSPHRASE,
    });
    if (!answer.ok) throw new Error(`Signing ${this.email} in was answered ${answer.status}.`);
    this.cookie = answer.headers
      .getSetCookie()
      .map((line) => line.split(';')[0])
      .join('; ');
  }

  /** A bottle with a litre in it. @returns its id */
  async mix(chemistryVersionId: string): Promise<string> {
    const bottleId = v7();
    const answer = await this.fetch(
      'PUT',
      this.address('mixes', v7()),
      this.told({
        bottleId,
        chemistryVersionId,
        volumeUl: 1_000_000,
        container: { sizeUl: 1_000_000, kind: 'bottle', material: 'glass' },
        material: 'film',
        from: { kind: 'hand' },
      }),
    );
    if (answer.status !== 201) throw new Error(`Mixing was answered ${answer.status}.`);
    return bottleId;
  }

  /** One roll through these bottles, under an id of its own. @returns whether it was answered as recorded */
  async tick(bottleIds: string[]): Promise<boolean> {
    const film = [{ format: '135-36', count: 1, filmClass: 'conventional' }];
    const body = JSON.stringify(this.told({ bottleIds, material: 'film', film }));
    const sent: Sent = { id: v7(), bottleIds, body, answered: false };
    this.sent.push(sent);
    await this.send(sent);
    return sent.answered;
  }

  /** The same words under the same id. */
  async send(sent: Sent): Promise<Outcome> {
    try {
      const answer = await this.fetch('PUT', this.address('loads', sent.id), sent.body);
      // The answer counts when all of it is here.
      await answer.text();
      if (answer.ok) sent.answered = true;
      if (answer.status === 401) await this.signIn();
      return answer.status;
    } catch {
      return null;
    }
  }

  private address(what: string, id: string): string {
    return `/api/darkrooms/${this.darkroomId}/${what}/${id}`;
  }

  private told(content: object): object {
    const now = this.now().toISOString();
    return {
      content: { v: 1, happenedAt: now, ...content },
      envelope: { sentAt: now, deviceNow: now, queued: false },
    };
  }

  private fetch(method: string, path: string, body: object | string): Promise<Response> {
    return fetch(`${this.url}${path}`, {
      method,
      body: typeof body === 'string' ? body : JSON.stringify(body),
      headers: {
        'content-type': 'application/json',
        'sec-fetch-site': 'same-origin',
        cookie: this.cookie,
      },
      signal: AbortSignal.timeout(PATIENCE_MS),
    });
  }
}
