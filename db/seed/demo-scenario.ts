import {
  addDays,
  type FilmClass,
  type LocalDate,
  type NamedFormat,
  type WasteRoute,
} from '@wetside/chemistry';
import { demoLoads, standingOn } from './demo-loads.js';
import type { DemoPerson, DemoSupplier } from './demo-people.js';

type Who = DemoPerson['key'];

/** What somebody did, by names that the player turns into ids: bottles, lots, orders and loads by their keys here. */
export type DemoDeed =
  | {
      do: 'receive';
      lot: string;
      pack: string;
      lotNumber: string;
      count: number;
      expiresOn: LocalDate | null;
      order?: string;
    }
  | {
      do: 'mix';
      bottle: string;
      chemistry: string;
      litres: number;
      from: 'new pack' | 'opened pack' | 'hand';
      lot?: string;
    }
  | { do: 'load'; load: string; bottles: string[]; format: NamedFormat; count: number; filmClass?: FilmClass }
  | { do: 'hold' | 'release'; bottle: string; reason: string }
  | { do: 'discard'; bottle: string; wasteRoute: WasteRoute }
  | { do: 'void'; load: string; reason: string }
  | { do: 'accept'; load: string; reason: string }
  | { do: 'draft'; order: string; supplier: DemoSupplier; pack: string; count: number }
  | { do: 'send'; order: string };

/** On which day of the scenario (0 is the anchor, negative is before it) and at what wall-clock time. */
export type DemoAction = DemoDeed & { day: number; at: string; by: Who };

const FIXER = 'Rapid fixer concentrate, 1 L';
const STOP = 'Stop bath SB-5 kit, 5 L';
const WETTING = 'Wetting agent concentrate, 250 mL';

const loadDeeds: DemoAction[] = demoLoads.map(
  ([day, at, by, count, format = '135-36', filmClass = 'conventional']) => {
    const { stop, fixer, wetting } = standingOn(day);
    return {
      day,
      at,
      by,
      do: 'load',
      load: `load ${day}`,
      bottles: [stop, fixer, wetting],
      format,
      count,
      filmClass,
    };
  },
);

/** The wetting agent is mixed fresh each week and the old one discarded. */
const wettingDeeds: DemoAction[] = [-49, -42, -35, -28, -21, -14, -6].flatMap((day, index): DemoAction[] => [
  { day, at: '09:30', by: 'tomas', do: 'discard', bottle: `WT-0${index + 1}`, wasteRoute: 'other' },
  {
    day,
    at: '09:35',
    by: 'tomas',
    do: 'mix',
    bottle: `WT-0${index + 2}`,
    chemistry: 'wetting-agent',
    litres: 1,
    from: 'opened pack',
    lot: 'WA1',
  },
]);

const renewed = (day: number, old: string, fresh: string): DemoAction[] => [
  { day, at: '09:40', by: 'tomas', do: 'discard', bottle: old, wasteRoute: 'stop-and-acids' },
  {
    day,
    at: '09:50',
    by: 'tomas',
    do: 'mix',
    bottle: fresh,
    chemistry: 'stop-bath-sb5',
    litres: 1,
    from: 'opened pack',
    lot: 'SB1',
  },
];

/**
 * Eight weeks of a club, ending on the anchor: its fixer used up and replaced, stop baths renewed, wetting agent mixed
 * each week, an order drafted, sent and received; a tick in the wrong bottle taken back, a bottle held and released, a
 * load reported through a held bath. A pure function of the date; all of it is invented.
 */
export function demoScenario(anchor: LocalDate): DemoAction[] {
  const deeds: DemoAction[] = [
    {
      day: -56,
      at: '09:00',
      by: 'tomas',
      do: 'receive',
      lot: 'F1',
      pack: FIXER,
      lotNumber: '2219',
      count: 2,
      expiresOn: addDays(anchor, 420),
    },
    {
      day: -56,
      at: '09:02',
      by: 'tomas',
      do: 'receive',
      lot: 'SB1',
      pack: STOP,
      lotNumber: 'K-118',
      count: 3,
      expiresOn: null,
    },
    {
      day: -56,
      at: '09:04',
      by: 'tomas',
      do: 'receive',
      lot: 'WA1',
      pack: WETTING,
      lotNumber: '771',
      count: 3,
      expiresOn: null,
    },
    {
      day: -56,
      at: '09:20',
      by: 'tomas',
      do: 'mix',
      bottle: 'SB-01',
      chemistry: 'stop-bath-sb5',
      litres: 1,
      from: 'new pack',
      lot: 'SB1',
    },
    {
      day: -56,
      at: '09:30',
      by: 'tomas',
      do: 'mix',
      bottle: 'FX-01',
      chemistry: 'rapid-fixer',
      litres: 1,
      from: 'new pack',
      lot: 'F1',
    },
    {
      day: -56,
      at: '09:40',
      by: 'tomas',
      do: 'mix',
      bottle: 'WT-01',
      chemistry: 'wetting-agent',
      litres: 1,
      from: 'new pack',
      lot: 'WA1',
    },
    ...wettingDeeds,
    ...renewed(-37, 'SB-01', 'SB-02'),
    ...renewed(-21, 'SB-02', 'SB-03'),
    ...renewed(-6, 'SB-03', 'SB-04'),
    ...loadDeeds,
    {
      day: -45,
      at: '19:00',
      by: 'marek',
      do: 'load',
      load: 'wrong bottle',
      bottles: ['SB-01', 'FX-01'],
      format: '120',
      count: 3,
      filmClass: 'conventional',
    },
    {
      day: -45,
      at: '19:01',
      by: 'marek',
      do: 'void',
      load: 'wrong bottle',
      reason: 'it was somebody else’s count',
    },
    { day: -31, at: '18:10', by: 'ines', do: 'hold', bottle: 'SB-02', reason: 'smells wrong' },
    {
      day: -31,
      at: '18:40',
      by: 'marek',
      do: 'load',
      load: 'through a held bath',
      bottles: ['SB-02', 'FX-01'],
      format: '135-36',
      count: 1,
      filmClass: 'conventional',
    },
    {
      day: -30,
      at: '09:10',
      by: 'tomas',
      do: 'release',
      bottle: 'SB-02',
      reason: 'pH 4.6, nothing wrong with it',
    },
    {
      day: -30,
      at: '09:12',
      by: 'tomas',
      do: 'accept',
      load: 'through a held bath',
      reason: 'the bath was sound',
    },
    { day: -28, at: '10:00', by: 'tomas', do: 'discard', bottle: 'FX-01', wasteRoute: 'fixer-silver' },
    {
      day: -28,
      at: '10:10',
      by: 'tomas',
      do: 'mix',
      bottle: 'FX-02',
      chemistry: 'rapid-fixer',
      litres: 1,
      from: 'opened pack',
      lot: 'F1',
    },
    {
      day: -55,
      at: '20:00',
      by: 'tomas',
      do: 'draft',
      order: 'first',
      supplier: 'quayside',
      pack: FIXER,
      count: 1,
    },
    { day: -54, at: '08:30', by: 'ada', do: 'send', order: 'first' },
    {
      day: -47,
      at: '16:00',
      by: 'tomas',
      do: 'receive',
      lot: 'F2',
      pack: FIXER,
      lotNumber: '2304',
      count: 1,
      expiresOn: addDays(anchor, 510),
      order: 'first',
    },
    { day: -2, at: '17:30', by: 'marek', do: 'hold', bottle: 'SB-04', reason: 'wrong colour' },
    { day: -1, at: '17:45', by: 'tomas', do: 'release', bottle: 'SB-04', reason: 'it was the lamp' },
    {
      day: -8,
      at: '17:50',
      by: 'tomas',
      do: 'mix',
      bottle: 'FX-03',
      chemistry: 'rapid-fixer',
      litres: 4,
      from: 'new pack',
      lot: 'F1',
    },
    {
      day: -7,
      at: '15:20',
      by: 'ines',
      do: 'load',
      load: 'Saturday class',
      bottles: ['FX-03'],
      format: '120',
      count: 12,
      filmClass: 'conventional',
    },
  ];
  return deeds.sort((a, b) => a.day - b.day || a.at.localeCompare(b.at));
}
