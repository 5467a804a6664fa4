import type { Clock } from '../../platform/clock/clock.js';

export interface Person {
  email: string;
  passphrase: string;
}

/** Somebody who is signed in at a running program. */
export class Caller {
  private constructor(
    private readonly url: string,
    private readonly clock: Clock,
    private readonly cookie: string,
  ) {}

  static async signIn(url: string, clock: Clock, person: Person): Promise<Caller> {
    const answer = await fetch(`${url}/api/sign-in`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'sec-fetch-site': 'same-origin' },
      body: JSON.stringify(person),
    });
    if (!answer.ok) throw new Error(`Sign-in: ${answer.status} ${await answer.text()}`);
    const cookies = answer.headers.getSetCookie().map((line) => line.split(';')[0]);
    return new Caller(url, clock, cookies.join('; '));
  }

  async put(darkroomId: string, what: string, actionId: string, content: object): Promise<void> {
    const now = this.clock.nowIso();
    await this.ask('PUT', `darkrooms/${darkroomId}/${what}/${actionId}`, {
      content: { v: 1, happenedAt: now, ...content },
      envelope: { sentAt: now, deviceNow: now, queued: false },
    });
  }

  async get(path: string): Promise<void> {
    await this.ask('GET', path);
  }

  private async ask(method: string, path: string, body?: object): Promise<void> {
    const answer = await fetch(`${this.url}/api/${path}`, {
      method,
      headers: {
        'content-type': 'application/json',
        'sec-fetch-site': 'same-origin',
        cookie: this.cookie,
      },
      ...(body ? { body: JSON.stringify(body) } : {}),
    });
    const text = await answer.text();
    if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${text}`);
  }
}
