import { chance, type Chance } from '@wetside/chemistry/testing';
import { v7 } from 'uuid';
import type { FilledHouse } from '../testing/filled-house.js';
import { signedCookie } from '../testing/signed-cookie.js';
import { type Attempt, type Attempts } from '../walks/route-attempts.js';
import { OWN_PAGES } from '../walks/route-people.js';
import { filledUp, mutated, strayed, written } from './mutate.js';
import type { Json } from './schema.js';
import { type Answer, type sender, type Sent } from './wire.js';

/** Routes whose right request costs a passphrase's hash: asked now and then only. */
const DEAR = new Set(['POST /sign-in', 'POST /sign-in/refresh', 'POST /sign-out']);
/** How often a right request is used as it is told before a new one is made. */
const USES = 8;
/** Requests that are under way at once, so that they meet each other's locks. */
const LANES = 3;

/** Requests by their route, and of what class their answers were. */
export type Tally = Record<string, Record<string, number>>;

export interface Fuzzed {
  requests: number;
  byRoute: Tally;
  /** By the code of the problem. */
  byCode: Record<string, number>;
  /** Each with the seed and the request. */
  complaints: string[];
}

export const NOTHING_YET = (): Fuzzed => ({ requests: 0, byRoute: {}, byCode: {}, complaints: [] });

/** Sends so many requests, each made by chance out of a right one, as the manager of a darkroom. */
export class Fuzzer {
  private readonly routes: readonly string[];
  private readonly made = new Map<string, { attempt: Attempt; uses: number }>();
  private cookie = '';

  constructor(
    private readonly filled: FilledHouse,
    private readonly wire: ReturnType<typeof sender>,
    private readonly attempts: Attempts,
  ) {
    this.routes = Object.keys(attempts);
  }

  /** @param seed the same one makes the same choices; ids and times are those of the house */
  async run(count: number, seed: number, fuzzed: Fuzzed): Promise<void> {
    this.cookie = await signedCookie(this.filled.house.t, this.filled.emails.manager);
    const lanes = Array.from({ length: LANES }, (_, lane) => {
      const share = Math.floor((count + lane) / LANES);
      return this.lane(share, seed * LANES + lane, `seed ${seed}, lane ${lane}`, fuzzed);
    });
    await Promise.all(lanes);
  }

  private async lane(count: number, seed: number, which: string, fuzzed: Fuzzed): Promise<void> {
    const by = chance(seed);
    let sent = 0;
    while (sent < count) {
      const route = by.pickAny(this.routes) ?? '';
      if (DEAR.has(route) && !by.percent(10)) continue;
      if (route.startsWith('GET') && !by.percent(40)) continue;
      const request = await this.next(route, by);
      if (!request) continue;
      sent += 1;
      fuzzed.requests += 1;
      await this.ask(route, request, `${which}, request ${sent}`, fuzzed);
    }
  }

  private async next(route: string, by: Chance): Promise<Sent | null> {
    const right = await this.right(route);
    if (!right) return null;
    const { url, body, cookie } = right;
    const ids = Object.values(this.filled.ids);
    const target = strayed(fresh(url), by, ids);
    const headers = { ...OWN_PAGES, cookie: cookie ?? this.cookie };
    const [method = '', path = ''] = route.split(' ');
    const what = path.split('/').at(-2) ?? '';
    if (body === undefined) return { method, target, headers, body: undefined };
    const type = by.percent(98)
      ? 'application/json'
      : by.pick(['text/plain', 'application/xml', 'application/json; charset=utf-7', '']);
    // What the factory made is JSON.
    const whole = filledUp(JSON.parse(JSON.stringify(body)) as Json, what, by, ids);
    const text = written(mutated(whole, by, ids), by);
    return {
      method,
      target,
      headers: { ...headers, ...(type === '' ? {} : { 'content-type': type }) },
      body: text,
    };
  }

  /** Null while none can be made: after wrong sign-ins of the fuzz the person waits, and this house's turn may end first. */
  private async right(route: string): Promise<Attempt | null> {
    const known = this.made.get(route);
    if (known && known.uses < USES) {
      known.uses += 1;
      return known.attempt;
    }
    const make = this.attempts[route];
    if (!make) throw new Error(`Nobody says how to call ${route}.`);
    // What was done meanwhile may stand in the way of making one anew: then the last one is good for longer.
    const attempt = await Promise.resolve(make(this.filled)).catch(() => known?.attempt);
    if (!attempt) return null;
    this.made.set(route, { attempt, uses: 1 });
    return attempt;
  }

  private async ask(route: string, sent: Sent, which: string, fuzzed: Fuzzed): Promise<void> {
    let complaint: string | null;
    try {
      const answer = await this.wire.send(sent);
      const kind = `${Math.floor(answer.status / 100)}xx`;
      const tally = (fuzzed.byRoute[route] ??= {});
      tally[kind] = (tally[kind] ?? 0) + 1;
      const code = codeOf(answer);
      if (code !== '') fuzzed.byCode[code] = (fuzzed.byCode[code] ?? 0) + 1;
      complaint = complaintOf(answer, code);
    } catch (error) {
      complaint = String(error);
    }
    if (complaint === null) return;
    const { headers, ...request } = sent;
    const text = JSON.stringify({ ...request, type: headers['content-type'] });
    fuzzed.complaints.push(`${route}: ${complaint} (${which}) ${text.slice(0, 2_000)}`);
  }
}

/** An action's id of its own for each request: the same one twice would only be a replay. */
const fresh = (url: string): string =>
  /(receipts|mixes|loads|decisions|holds|releases|discards|voids|setting-changes|order-\w+)\//.test(url)
    ? url.replace(/[^/]+$/, v7())
    : url;

function document(answer: Answer): Record<string, unknown> {
  try {
    const read: unknown = JSON.parse(answer.text);
    return typeof read === 'object' && read !== null ? (read as Record<string, unknown>) : {};
  } catch {
    return {};
  }
}

const codeOf = (answer: Answer): string => {
  const { code } = answer.status >= 400 ? document(answer) : {};
  return typeof code === 'string' ? code : '';
};

function complaintOf(answer: Answer, code: string): string | null {
  const { status, type, text } = answer;
  if (status >= 500) return `${status} ${text.slice(0, 200)}`;
  if (status < 400) return null;
  const { detail } = document(answer);
  if (!type.startsWith('application/problem+json')) return `${status} as ${type}`;
  if (code === '' || typeof detail !== 'string' || !/^[^a-z].*[.!?]$/su.test(detail))
    return `${status} without a sentence: ${text.slice(0, 200)}`;
  return null;
}
