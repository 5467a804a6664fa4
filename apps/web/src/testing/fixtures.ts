import {
  type BottleFact,
  type ChemistryDocument,
  defaultThresholds,
  fold,
  localDate,
  starterCatalogue,
} from '@wetside/chemistry';
import type {
  ActionView,
  BottleList,
  BottleView,
  Darkroom,
  LoadAnswer,
  Me,
  MemberRole,
} from '../shared/api/types.js';
import { reckonedNow } from '../shared/clock/web-clock.js';

export const zone = 'Europe/Amsterdam';

export const darkroom = (role: MemberRole = 'member'): Darkroom => ({
  id: 'd-1',
  shortName: 'harbour',
  name: 'Harbour Lane',
  zone,
  units: { temperature: 'C', volume: 'mL' },
  currency: 'EUR',
  thresholds: { ...defaultThresholds, smallestTankUl: 300_000 },
  me: { membershipId: 'm-1', role, displayName: 'Ines' },
});

export const me = (role: MemberRole = 'member'): Me => ({
  person: { id: 'p-1', name: 'Ines' },
  darkrooms: [{ id: 'd-1', shortName: 'harbour', name: 'Harbour Lane', role }],
  now: reckonedNow(),
});

function documentOf(role: string): ChemistryDocument {
  const found = starterCatalogue.find(({ document }) => document.role === role);
  if (!found) throw new Error(`the starter catalogue has no ${role}`);
  return found.document;
}

export const fixer = documentOf('fixer');
export const stopBath = documentOf('stop-bath');
export const wettingAgent = documentOf('wetting-agent');

export interface BottleSketch {
  code: string;
  document: ChemistryDocument;
  /** Rolls through it so far. */
  rolls?: number;
  daysOld?: number;
  hold?: string;
  volumeUl?: number;
}

const DAY_MS = 86_400_000;

/** A bottle with a history, folded by the program's own rule. */
export function bottle({
  code,
  document,
  rolls = 0,
  daysOld = 1,
  hold,
  volumeUl = 1_000_000,
}: BottleSketch): BottleView {
  const nowMs = Date.parse(reckonedNow());
  const place = (actionId: string, seq: number, ms: number) => {
    const happenedAt = new Date(ms).toISOString();
    return { actionId, seq, happenedAt, happenedOn: localDate(happenedAt, zone) };
  };
  const mixedMs = nowMs - daysOld * DAY_MS;
  const container = { sizeUl: volumeUl, kind: 'bottle' as const };
  const facts: BottleFact[] = [
    { ...place(`mix-${code}`, 1, mixedMs), kind: 'mix', volumeUl, container, material: 'film' },
  ];
  if (rolls > 0) {
    const charges = [{ material: 'film' as const, countedE4: rolls * 10_000, takenUl: 0 }];
    facts.push({ ...place(`load-${code}`, 2, mixedMs + 60_000), kind: 'load', charges });
  }
  if (hold) facts.push({ ...place(`hold-${code}`, 3, mixedMs + 120_000), kind: 'hold', reason: hold });
  const totals = fold(document, facts);
  if (!totals) throw new Error(`${code} was never mixed`);
  return {
    id: `b-${code}`,
    code,
    chemistryVersionId: `v-${document.role}`,
    name: document.name,
    role: document.role,
    material: 'film',
    totals,
    holdBy: hold ? 'Tomas' : null,
    costMinor: null,
    currency: null,
    mixedBy: 'Tomas',
  };
}

export function bottleList(sketches: readonly BottleSketch[]): BottleList {
  const versions = Object.fromEntries(sketches.map(({ document }) => [`v-${document.role}`, document]));
  return { bottles: sketches.map(bottle), versions, today: localDate(reckonedNow(), zone) };
}

export const actionView = (id: string, kind: ActionView['kind']): ActionView => ({
  id,
  kind,
  happenedAt: reckonedNow(),
  happenedOn: localDate(reckonedNow(), zone),
  recordedAt: reckonedNow(),
  seq: 100,
  by: { membershipId: 'm-1', displayName: 'Ines' },
  voidedBy: null,
  canUndo: true,
});

export const loadAnswer = (actionId: string, bottles: BottleView[]): LoadAnswer => ({
  action: actionView(actionId, 'load'),
  load: { flags: [], note: null, film: [], steps: [] },
  bottles,
});
