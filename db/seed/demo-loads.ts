import type { FilmClass, NamedFormat } from '@wetside/chemistry';
import type { DemoPerson } from './demo-people.js';

type Who = DemoPerson['key'];
type Loads = [day: number, at: string, by: Who, count: number, format?: NamedFormat, filmClass?: FilmClass][];

/** A bath of each kind that a load went through on its day. */
export interface Standing {
  from: number;
  stop: string;
  fixer: string;
  wetting: string;
}

const standings: Standing[] = [
  { from: -56, stop: 'SB-01', fixer: 'FX-01', wetting: 'WT-01' },
  { from: -49, stop: 'SB-01', fixer: 'FX-01', wetting: 'WT-02' },
  { from: -42, stop: 'SB-01', fixer: 'FX-01', wetting: 'WT-03' },
  { from: -37, stop: 'SB-02', fixer: 'FX-01', wetting: 'WT-03' },
  { from: -35, stop: 'SB-02', fixer: 'FX-01', wetting: 'WT-04' },
  { from: -28, stop: 'SB-02', fixer: 'FX-02', wetting: 'WT-05' },
  { from: -21, stop: 'SB-03', fixer: 'FX-02', wetting: 'WT-06' },
  { from: -14, stop: 'SB-03', fixer: 'FX-02', wetting: 'WT-07' },
  { from: -6, stop: 'SB-04', fixer: 'FX-02', wetting: 'WT-08' },
];

export const demoLoads: Loads = [
  [-55, '18:20', 'ines', 2],
  [-53, '19:05', 'marek', 1, '120'],
  [-50, '17:40', 'tomas', 1],
  [-48, '20:10', 'ines', 1],
  [-46, '18:30', 'ines', 2],
  [-43, '11:15', 'marek', 2, '120'],
  [-41, '18:00', 'tomas', 1],
  [-39, '19:20', 'ines', 2],
  [-36, '18:45', 'marek', 1, '120'],
  [-34, '19:30', 'ines', 2],
  [-32, '12:05', 'tomas', 2, '135-36'],
  [-27, '18:10', 'ines', 2],
  [-25, '19:40', 'marek', 1, '120'],
  [-23, '18:25', 'tomas', 1, '135-36', 'tabular-grain'],
  [-20, '18:15', 'ines', 1],
  [-18, '20:05', 'marek', 2, '120'],
  [-13, '18:50', 'ines', 1],
  [-11, '19:10', 'tomas', 2],
  [-5, '18:35', 'marek', 2, '120'],
  [-3, '19:15', 'ines', 1],
  [-1, '18:05', 'ines', 2],
];

export const standingOn = (day: number): Standing => {
  const found = standings.filter((one) => one.from <= day).at(-1);
  if (!found) throw new Error(`Nothing stands at the sink on day ${day}.`);
  return found;
};
