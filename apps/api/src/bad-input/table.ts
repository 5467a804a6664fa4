import type { ProblemCode, ProblemDocument } from '../platform/errors/problem.js';
import { rowStamps, writtenTables, type RowStamps } from './row-stamps.js';
import type { World } from './world.js';

export interface Answer {
  status: number;
  type: string;
  body: unknown;
  text?: string;
}

/** A request, or what has to be there first and then gives the request. */
export type Ask = (world: World) => PromiseLike<Answer | (() => PromiseLike<Answer>)>;

/** What is asked, the status, and of a refusal: its code, the field at fault, and a piece of its sentence. */
export type Row = readonly [
  what: string,
  ask: Ask,
  status: number,
  code?: ProblemCode,
  field?: string,
  says?: string,
];

/** Nothing of the inside may stand in a refusal. */
const INSIDE =
  /\bselect\b|\binsert into\b|\bconstraint\b|\bparams\b|postgres|node_modules|\.[jt]s:\d|\bat \w+\.\w+ \(/i;

/** A refusal is a problem document with a sentence, and names the field. */
export function expectRefusal(answer: Answer, [, , status, code, field, says]: Row): void {
  const told = answer.body as ProblemDocument;
  expect({ status: answer.status, told }).toMatchObject({
    status,
    told: { status, ...(code ? { code } : {}) },
  });
  expect(answer.type).toBe('application/problem+json');
  expect(told.type).toBe(`urn:wetside:problem:${told.code}`);
  expect(told.detail).toMatch(/^[A-Z0-9“].*[.?]$/su);
  expect(JSON.stringify(told)).not.toMatch(INSIDE);
  for (const { message } of told.errors ?? []) expect(message).toMatch(/^[A-Z].*\.$/su);
  if (field !== undefined) expect(told.errors?.map((one) => one.field)).toContain(field);
  if (says !== undefined) expect(JSON.stringify(told)).toContain(says);
}

/** Asks, and holds the answer against the row; what is refused must leave every table as it was. */
export async function judge(
  world: World,
  row: Row,
  known: RowStamps | null = null,
): Promise<RowStamps | null> {
  const [, ask, status] = row;
  const refused = status >= 400;
  let before = refused ? (known ?? (await rowStamps(world.root))) : null;
  let answer = await ask(world);
  if (typeof answer === 'function') {
    before = refused ? await rowStamps(world.root) : null;
    answer = await answer();
  }
  if (!before) {
    expect({ status: answer.status, body: answer.status < 400 ? undefined : answer.body }).toEqual({
      status,
    });
    return null;
  }
  expectRefusal(answer, row);
  const after = await rowStamps(world.root);
  expect(writtenTables(before, after)).toEqual([]);
  return after;
}

/** A table of cases; each is a test. */
export function table(topic: string, world: () => World, rows: readonly Row[]): void {
  describe(`${topic} (${rows.length} cases)`, () => {
    let judged = 0;
    let sums: RowStamps | null = null;
    it.each(rows.map((row) => [row[0], row] as const))('%s', async (_what, row) => {
      const known = sums;
      sums = null;
      judged += 1;
      sums = await judge(world(), row, known);
    });
    it('asks them all', () => {
      expect(rows.length).toBeGreaterThan(0);
      expect(judged).toBeGreaterThanOrEqual(rows.length);
    });
  });
}
