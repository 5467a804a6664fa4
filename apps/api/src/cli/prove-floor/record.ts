import type { INestApplication } from '@nestjs/common';
import { v7 } from 'uuid';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import { Caller, type Person } from './caller.js';
import type { FloorDarkroom } from './houses.js';

interface Statement {
  text: string;
  parameters: unknown[];
  /** Statements of one turn were sent together, before the first of them was answered. */
  turn: number;
}

/** What the program sends to PostgreSQL for one request each, from begin to commit. */
export interface RecordedDarkroom extends FloorDarkroom {
  /** The action whose id stands in the statements of `load`. */
  actionId: string;
  load: Statement[];
  sink: Statement[];
}

interface Options {
  debug: false | ((connection: number, text: string, parameters: unknown[]) => void);
}

export async function recordFloor(
  app: INestApplication,
  person: Person,
  darkrooms: readonly FloorDarkroom[],
): Promise<RecordedDarkroom[]> {
  const caller = await Caller.signIn(await app.getUrl(), app.get(Clock), person);
  const { client } = Reflect.get(app.get(Database), 'pool') as { client: { options: Options } };
  const { options } = client;
  const statementsOf = async (work: () => Promise<void>): Promise<Statement[]> => {
    const sent: Statement[] = [];
    let turn = 0;
    options.debug = (_, text, parameters) => {
      sent.push({ text, parameters: [...parameters], turn });
      setImmediate(() => (turn += 1));
    };
    await work();
    options.debug = false;
    return sent;
  };
  const recorded: RecordedDarkroom[] = [];
  for (const darkroom of darkrooms) {
    const actionId = v7();
    const content = {
      bottleIds: darkroom.bottleIds,
      material: 'film',
      film: [{ format: '135-36', count: 1, filmClass: 'conventional' }],
    };
    const load = await statementsOf(() => caller.put(darkroom.id, 'loads', actionId, content));
    const sink = await statementsOf(() => caller.get(`darkrooms/${darkroom.id}/bottles`));
    recorded.push({ ...darkroom, actionId, load, sink });
  }
  return recorded;
}
