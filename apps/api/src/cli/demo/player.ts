import type { INestApplicationContext } from '@nestjs/common';
import { addDays, localDate, startOfDay } from '@wetside/chemistry';
import { mails } from '@wetside/db';
import { demoDarkroom } from '@wetside/db/seed/demo-people';
import { demoScenario } from '@wetside/db/seed/demo-scenario';
import { and, eq, sql } from 'drizzle-orm';
import { Sweeper } from '../../features/alerts/sweeper.js';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import type { Cast } from './cast.js';
import { Stage } from './stage.js';

/** Plays the scenario through the services, each deed at its time, with a sweep each morning as a server would. */
export async function play(app: INestApplicationContext, cast: Cast, end: Date): Promise<number> {
  const { zone } = demoDarkroom;
  const anchor = localDate(end.toISOString(), zone);
  const clock = app.get(Clock);
  const stage = await Stage.set(app, cast);
  const deeds = demoScenario(anchor);
  let day = deeds[0]?.day ?? 0;
  for (const deed of deeds) {
    for (; day < deed.day; day += 1) await sweepAt(app, instantOf(anchor, day + 1, '07:00', zone));
    const at = instantOf(anchor, deed.day, deed.at, zone);
    clock.advance(at.getTime() - clock.now().getTime());
    await stage.act(deed, at);
  }
  clock.advance(end.getTime() - clock.now().getTime());
  await app.get(Sweeper).runOnce();
  await markMailsSent(app, cast);
  return deeds.length;
}

async function sweepAt(app: INestApplicationContext, at: Date): Promise<void> {
  const clock = app.get(Clock);
  clock.advance(at.getTime() - clock.now().getTime());
  await app.get(Sweeper).runOnce();
}

function instantOf(anchor: string, day: number, at: string, zone: string): Date {
  const [hours = 0, minutes = 0] = at.split(':').map(Number);
  return new Date(Date.parse(startOfDay(addDays(anchor, day), zone)) + (hours * 60 + minutes) * 60_000);
}

/** The demo's mails went out in the past that it tells of: stored as sent, never queued. */
async function markMailsSent(app: INestApplicationContext, { darkroomId }: Cast): Promise<void> {
  await app.get(Database).inDarkroom({ darkroomId }, (tx) =>
    tx
      .update(mails)
      .set({
        state: 'sent',
        sentAt: sql`${mails.dueAt}`,
        attempts: 1,
        lastAnswer: 'told by the demo, not sent',
      })
      .where(and(eq(mails.darkroomId, darkroomId), eq(mails.state, 'waiting'))),
  );
}
