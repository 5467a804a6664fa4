import { randomUUID } from 'node:crypto';
import { expect, type Page } from '@playwright/test';
import type { World } from './world.js';

/** Reads an address of the darkroom's API as the person of that page. */
export async function read<T>(world: World, page: Page, path: string): Promise<T> {
  const answer = await page.request.get(`${world.origin}/api/darkrooms/${world.place.shortName}/${path}`);
  expect(answer.ok(), `${path}: ${answer.status()}`).toBe(true);
  return (await answer.json()) as T;
}

/** Does something as the person of that page, without the page: to furnish a darkroom. Gives the action's id. */
export async function act(world: World, page: Page, plural: string, content: object): Promise<string> {
  const actionId = randomUUID();
  const { now } = (await (await page.request.get(`${world.origin}/api/me`)).json()) as { now: string };
  const answer = await page.request.put(
    `${world.origin}/api/darkrooms/${world.place.shortName}/${plural}/${actionId}`,
    {
      headers: { origin: world.origin },
      data: {
        content: { v: 1, happenedAt: now, ...content },
        envelope: { sentAt: now, deviceNow: now, queued: false },
      },
    },
  );
  expect(answer.ok(), `${plural}: ${answer.status()} ${answer.ok() ? '' : await answer.text()}`).toBe(true);
  return actionId;
}

interface Chemistries {
  chemistries: { versionId: string; document: { name: string; role: string } }[];
}
interface Shelf {
  packs: {
    id: string;
    form: string;
    lots: { id: string; opened: { id: string }[] }[];
    soldBy: { supplierId: string; supplierPackId: string }[];
  }[];
}

const LITRE_UL = 1_000_000;

/** A bottle mixed by hand. Gives its id. */
async function mix(world: World, technician: Page, role: string, litres = 1): Promise<string> {
  const { chemistries } = await read<Chemistries>(world, technician, 'chemistries');
  const chemistry = chemistries.find(({ document }) => document.role === role);
  const bottleId = randomUUID();
  await act(world, technician, 'mixes', {
    bottleId,
    chemistryVersionId: chemistry?.versionId,
    volumeUl: litres * LITRE_UL,
    container: { sizeUl: litres * LITRE_UL, kind: 'bottle' },
    material: 'film',
    from: { kind: 'hand' },
  });
  return bottleId;
}

const load = (
  world: World,
  page: Page,
  bottleIds: string[],
  count: number,
  more: object = {},
): Promise<string> =>
  act(world, page, 'loads', {
    bottleIds,
    material: 'film',
    film: [{ format: '135-36', count, filmClass: 'conventional' }],
    ...more,
  });

/** Something of everything that a page can show; gives an order in each state that has a page of its own. */
export async function fillDarkroom(
  world: World,
  people: { member: Page; technician: Page; manager: Page },
): Promise<{ draftId: string; sentId: string }> {
  const { member, technician, manager } = people;
  const [spent, held, good, stop] = [
    await mix(world, technician, 'fixer'),
    await mix(world, technician, 'fixer', 2),
    await mix(world, technician, 'fixer'),
    await mix(world, technician, 'stop-bath'),
  ];
  await mix(world, technician, 'wetting-agent');
  await load(world, member, [stop, spent], 12);
  await load(world, member, [spent], 8);
  const wrong = await load(world, member, [good], 3);
  await act(world, member, 'voids', { voidedActionId: wrong, reason: 'w'.repeat(80) });
  await act(world, member, 'holds', { bottleId: held, reason: 'h'.repeat(80) });
  await load(world, member, [held], 1, { reported: true });
  const { packs } = await read<Shelf>(world, technician, 'shelf');
  const sold = packs.flatMap((pack) => pack.soldBy.slice(0, 1));
  const lines = packs.map((pack) => ({
    packId: pack.id,
    lotId: randomUUID(),
    lotNumber: 'L'.repeat(30),
    expiresOn: null,
    count: 1,
  }));
  await act(world, technician, 'receipts', { lines });
  const order = async (): Promise<string> => {
    const orderId = randomUUID();
    const supplierId = sold[0]?.supplierId;
    const wanted = sold.map(({ supplierPackId }) => ({ id: randomUUID(), supplierPackId, count: 2 }));
    await act(world, technician, 'order-drafts', { orderId, supplierId, lines: wanted });
    return orderId;
  };
  const [sentId, draftId] = [await order(), await order()];
  await act(world, manager, 'order-sendings', { orderId: sentId, revision: 1 });
  return { draftId, sentId };
}
