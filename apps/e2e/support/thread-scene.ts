import type { Browser, Locator, Page } from '@playwright/test';
import type { LocalDate } from '@wetside/chemistry';
import type { Place } from './people.js';
import { World } from './world.js';

export const FIXER = 'Rapid fixer concentrate, 1 L';
export const WETTING = 'Wetting agent concentrate, 250 mL';
export const CHEMISTRY = 'Rapid fixer 1+4, film';

export const place: Place = {
  shortName: 'rope-walk',
  name: 'Rope Walk Darkroom',
  zone: 'Europe/Dublin',
  cast: {
    member: { name: 'Mara Lind', email: 'mara@ropewalk.example' },
    technician: { name: 'Pavel Roth', email: 'pavel@ropewalk.example' },
    manager: { name: 'Noor Adler', email: 'noor@ropewalk.example' },
  },
  suppliers: [
    {
      name: 'Low Quay Supplies',
      email: 'orders@lowquay.example',
      packs: [
        { pack: FIXER, supplierName: 'LQ 17 rapid fixer, litre', priceMinor: 1_150 },
        { pack: WETTING, supplierName: 'LQ 40 wetting agent', priceMinor: 780 },
      ],
    },
  ],
};
const { technician: pavel, manager: noor } = place.cast;
/** Who is told of a warning. */
export const warned = [pavel.email, noor.email];

/** The three people of the story, each with a phone, and the day it begins. */
export interface Scene {
  world: World;
  member: Page;
  technician: Page;
  manager: Page;
  today: LocalDate;
}

export async function makeScene(browser: Browser): Promise<Scene> {
  const world = await World.make(place);
  const [member, technician, manager, today] = await Promise.all([
    world.open(browser),
    world.open(browser),
    world.open(browser),
    world.today(),
  ]);
  return { world, member, technician, manager, today };
}

/** A kind of pack on the shelf page. */
export const onShelf = (page: Page, pack: string): Locator =>
  page.getByRole('list', { name: 'On the shelf' }).locator(':scope > li').filter({ hasText: pack });
