import type { NestExpressApplication } from '@nestjs/platform-express';
import type postgres from 'postgres';
import type { RegisteredRoute } from '../platform/auth/routes.js';
import type { FilledHouse } from '../testing/filled-house.js';
import { send } from '../testing/send.js';
import { changedTables, tableSums } from '../testing/table-sums.js';
import type { Attempt, Attempts } from './route-attempts.js';
import { OWN_PAGES, refusedBy, type Refused, type SignedIn } from './route-people.js';

/** What a walk is made in. */
export interface Ground {
  app: NestExpressApplication;
  root: postgres.Sql;
  own: FilledHouse;
  foreign: FilledHouse;
  shortName: string;
  people: SignedIn;
  badTokens: readonly [string, string][];
}

export interface Walked {
  requests: number;
  /** Who sent them, in words. */
  persons: string[];
  complaints: string[];
}

export const keyOf = ({ method, path }: RegisteredRoute): string => `${method} ${path}`;

/** Sentences about routes for which nobody has a right request, and about requests for routes that are gone. */
export function unmatched(routes: readonly RegisteredRoute[], attempts: Attempts): string[] {
  const keys = routes.map(keyOf);
  return [
    ...keys.filter((key) => !attempts[key]).map((key) => `Nobody says how to call ${key}.`),
    ...Object.keys(attempts)
      .filter((key) => !keys.includes(key))
      .map((key) => `There is no ${key} any more.`),
  ];
}

const codeOf = (body: unknown): string =>
  typeof body === 'object' && body !== null && 'code' in body ? String(body.code) : '';

/** One person after the other is refused, then the least role succeeds with the very same request. */
export async function walkRoute(
  ground: Ground,
  route: RegisteredRoute,
  make: (house: FilledHouse) => Attempt | Promise<Attempt>,
): Promise<Walked> {
  const { app, root, own, foreign, people } = ground;
  const key = keyOf(route);
  const { access } = route;
  if (!access) return { requests: 0, persons: [], complaints: [`${key} is open.`] };
  const attempt = await make(own);
  const theirs = await make(foreign);
  const complaints: string[] = [];
  const before = await tableSums(root);
  const best = attempt.cookie ?? people.roles[access.kind === 'role' ? access.least : 'manager'];
  const refused = refusedBy(access, route.method, people, ground.badTokens, best);
  for (const one of refused) complaints.push(...(await refusal(ground, route, attempt, one)));
  const crosses = access.kind === 'role' && theirs.names;
  if (crosses) complaints.push(...(await acrossDarkrooms(ground, route, theirs)));
  const after = await tableSums(root);
  complaints.push(
    ...changedTables(before, after).map((table) => `${key} changed ${table}, though it refused.`),
  );
  const done = await send(app, route.method, attempt.url)
    .send(attempt.body)
    .set(OWN_PAGES)
    .set('cookie', best);
  if (done.status < 200 || done.status > 299)
    complaints.push(`${key} answers its least role ${done.status} ${codeOf(done.body)}.`);
  if (route.method === 'GET' && changedTables(after, await tableSums(root)).length > 0)
    complaints.push(`${key} changes something, though it only reads.`);
  const served = access.kind === 'role' ? `the least role, a ${access.least}` : 'whoever may';
  const persons = [
    ...refused.map(({ who }) => who),
    ...(crosses ? ['another darkroom’s manager'] : []),
    served,
  ];
  return { requests: persons.length, persons, complaints };
}

async function refusal(
  { app, own, shortName }: Ground,
  route: RegisteredRoute,
  { url, body }: Attempt,
  { who, cookie, headers, status, codes, byShortName }: Refused,
): Promise<string[]> {
  const to = byShortName ? url.replace(own.ids.darkroomId, shortName) : url;
  const answer = await send(app, route.method, to).send(body).set(headers).set('cookie', cookie);
  return answer.status === status && codes.includes(codeOf(answer.body))
    ? []
    : [`${keyOf(route)} answers ${who} ${answer.status} ${codeOf(answer.body)}.`];
}

/** The manager of one darkroom names rows of another: as if they were not. */
async function acrossDarkrooms(
  { app, own, foreign, people }: Ground,
  route: RegisteredRoute,
  { url, body }: Attempt,
): Promise<string[]> {
  const here = url.replace(foreign.ids.darkroomId, own.ids.darkroomId);
  const answer = await send(app, route.method, here)
    .send(body)
    .set(OWN_PAGES)
    .set('cookie', people.roles.manager);
  const code = codeOf(answer.body);
  return (answer.status === 404 && code === 'not-found') || (answer.status === 400 && code === 'invalid')
    ? []
    : [`${keyOf(route)} answers a manager about another darkroom's rows ${answer.status} ${code}.`];
}
