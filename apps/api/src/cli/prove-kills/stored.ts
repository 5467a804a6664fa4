import postgres from 'postgres';
import type { Stored } from './compare.js';

/** Reads what a darkroom's loads and bottles are, past every policy. */
export async function readStored(adminUrl: string, darkroomId: string): Promise<Stored> {
  const admin = postgres(adminUrl, { max: 1, onnotice: () => undefined });
  try {
    const loads = await admin<Stored['loads'][number][]>`
      select a.id, count(distinct l.action_id)::int as times, count(s.bottle_id)::int as bottles
      from actions a
      left join loads l on l.darkroom_id = a.darkroom_id and l.action_id = a.id
      left join load_steps s on s.darkroom_id = a.darkroom_id and s.action_id = a.id
      where a.darkroom_id = ${darkroomId} and a.kind = 'load' group by a.id`;
    const totals = await admin<Stored['totals'][number][]>`
      select bottle_id as "bottleId", (totals ->> 'loads')::int as loads,
        coalesce((totals -> 'usedE4' ->> 'film')::int, 0) as "usedE4"
      from bottle_totals where darkroom_id = ${darkroomId}`;
    return { loads, totals };
  } finally {
    await admin.end();
  }
}
