import { chargeFor } from '../charge.js';
import type { Container } from '../container.js';
import { localDate } from '../dates.js';
import type { ChemistryDocument } from '../document.js';
import { type FilmClass, namedFormats, type NamedFormat } from '../film.js';
import type { BottleFact, FactBase } from '../ledger.js';
import { drawFrom, type Known, mayBefall, starterDocument } from './program-rules.js';
import { type Chance, chance, seededId } from './random.js';

export { starterDocument } from './program-rules.js';
export { chance, seededId, type Chance } from './random.js';

/** One action: what it did to each bottle. Late = told for a time before an action already recorded. */
export interface HistoryAct {
  kind: 'act';
  actionId: string;
  what: 'mix' | 'load' | 'hold' | 'release' | 'discard' | 'container-change' | 'reading' | 'top-up';
  late: boolean;
  /** Only of a load: the film, and the time it was told for where that was before the bottle was mixed. */
  film?: { format: NamedFormat; count: number; filmClass: FilmClass };
  toldAt?: string;
  facts: { bottle: string; fact: BottleFact }[];
}

/** Withdraws an earlier action. A mix is withdrawn only while nothing that stands leans on its bottle. */
export interface HistoryVoid {
  kind: 'void';
  actionId: string;
  happenedAt: string;
  voids: string;
}

export type HistoryStep = HistoryAct | HistoryVoid;

/** The documents are keys of the starter catalogue. */
export interface History {
  seed: number;
  zone: string;
  bottles: { id: string; documentKey: string }[];
  steps: HistoryStep[];
}

interface Bottle {
  id: string;
  mixedMs: number;
  mixAction: string;
}

/** Everything that the ledger can hold, or only what the program records by now and would not refuse. */
export type Reach = 'everything' | 'recorded';

interface Making {
  by: Chance;
  reach: Reach;
  history: History;
  nowMs: number;
  seq: number;
  standing: Bottle[];
  voided: Set<string>;
}

const MINUTE = 60_000;
const DAY = 1_440 * MINUTE;

function base(making: Making, atMs: number): FactBase {
  making.seq += 1;
  const happenedAt = new Date(atMs).toISOString();
  return {
    actionId: seededId(making.nowMs, making.by),
    seq: making.seq,
    happenedAt,
    happenedOn: localDate(happenedAt, making.history.zone),
  };
}

function record(making: Making, act: Omit<HistoryAct, 'kind' | 'actionId'>): void {
  const actionId = act.facts[0]?.fact.actionId;
  if (actionId !== undefined) making.history.steps.push({ kind: 'act', actionId, ...act });
}

function knownOf(making: Making, bottle: string): Known {
  const { history, nowMs } = making;
  return {
    document: documentOf(history, bottle),
    facts: factsOf(history.steps, bottle),
    nowMs,
    zone: history.zone,
  };
}

const containers: [Container, ...Container[]] = [
  { sizeUl: 1_000_000, kind: 'bottle', material: 'glass' },
  { sizeUl: 600_000, kind: 'bottle', material: 'pet' },
  { sizeUl: 1_000_000, kind: 'floating-lid' },
  { sizeUl: 2_000_000, kind: 'tray' },
  { sizeUl: 1_000_000, kind: 'bottle', material: 'concertina' },
];

/** A new bottle; half the time it is poured from another one, which loses that volume in the same action. */
function mix(making: Making): void {
  const { by, history } = making;
  const fact = base(making, making.nowMs);
  const id = seededId(making.nowMs, by);
  const documentKey = by.pick(['rapid-fixer', 'rapid-fixer', 'stop-bath-sb5', 'wetting-agent']);
  const from = by.percent(50) ? by.pickAny(making.standing) : undefined;
  const container = by.pick(containers);
  const volumeUl = Math.min(container.sizeUl, by.between(500, 1_000) * 1_000);
  const facts: HistoryAct['facts'] = [
    { bottle: id, fact: { ...fact, kind: 'mix', volumeUl, container, material: 'film' } },
  ];
  if (from) {
    const anyUl = by.between(20, 200) * 1_000;
    const takenUl =
      making.reach === 'everything'
        ? anyUl
        : drawFrom(knownOf(making, from.id), starterDocument(documentKey), volumeUl);
    if (takenUl !== null) facts.push({ bottle: from.id, fact: { ...fact, kind: 'draw', takenUl } });
  }
  history.bottles.push({ id, documentKey });
  making.standing.push({ id, mixedMs: making.nowMs, mixAction: fact.actionId });
  record(making, { what: 'mix', late: false, facts });
}

/** A load through one or two bottles, a fifth of them told late. */
function load(making: Making): void {
  const { by } = making;
  const first = by.pickAny(making.standing);
  if (!first) return;
  const second = by.percent(40) ? by.pickAny(making.standing.filter((other) => other !== first)) : undefined;
  const through = second ? [first, second] : [first];
  const earliest = Math.max(...through.map((bottle) => bottle.mixedMs));
  const late = by.percent(20);
  let atMs = late ? Math.max(earliest, making.nowMs - by.between(1, 5 * 1_440) * MINUTE) : making.nowMs;
  const recorded = making.reach === 'recorded';
  // A slow phone at a fresh bottle: told for before it was mixed, it stands at the mix's time.
  const tooEarly = recorded && by.percent(8);
  if (tooEarly) atMs = earliest;
  const fact = base(making, atMs);
  const film = { format: by.pick(namedFormats), count: by.between(1, 4), filmClass: classOf(making) };
  const anyUl = by.percent(60) ? by.between(1, 60) * 1_000 : 0;
  const facts = through.map(({ id }, index): HistoryAct['facts'][number] => {
    const { countedE4 } = chargeFor(documentOf(making.history, id), [film], 'film');
    const takenUl = index === 0 && !recorded ? anyUl : 0;
    return {
      bottle: id,
      fact: { ...fact, kind: 'load', charges: [{ material: 'film', countedE4, takenUl }] },
    };
  });
  const told = tooEarly ? { toldAt: new Date(atMs - by.between(1, 1_440) * MINUTE).toISOString() } : {};
  record(making, { what: 'load', late: atMs < making.nowMs, film, ...told, facts });
}

const classOf = ({ by, reach }: Making): FilmClass =>
  reach === 'everything'
    ? 'conventional'
    : by.pick(['conventional', 'conventional', 'tabular-grain', 'not-sure']);

type Befalling = Exclude<HistoryAct['what'], 'mix' | 'load'>;

function whatBefalls(making: Making, bottle: string): Befalling | undefined {
  const { by, reach } = making;
  if (reach === 'recorded') return by.pickAny(mayBefall(knownOf(making, bottle)));
  return by.pick<Befalling>([
    'hold',
    'release',
    'container-change',
    'container-change',
    'reading',
    'top-up',
    'discard',
  ]);
}

/** Everything else that befalls one bottle. */
function befall(making: Making): void {
  const { by } = making;
  const bottle = by.pickAny(making.standing);
  if (!bottle) return;
  const what = whatBefalls(making, bottle.id);
  if (!what) return;
  const late = what !== 'discard' && by.percent(35);
  const atMs = late ? Math.max(bottle.mixedMs, making.nowMs - by.between(1, 1_440) * MINUTE) : making.nowMs;
  const fact = base(making, atMs);
  const details: Record<Befalling, BottleFact> = {
    hold: { ...fact, kind: 'hold', reason: by.pick(['cloudy', 'smells wrong']) },
    release: { ...fact, kind: 'release' },
    'container-change': { ...fact, kind: 'container-change', container: by.pick(containers) },
    reading: { ...fact, kind: 'reading', shareE4: { film: by.between(0, 10_000) } },
    'top-up': { ...fact, kind: 'top-up', addedUl: by.between(10, 200) * 1_000 },
    discard: { ...fact, kind: 'discard' },
  };
  record(making, { what, late: atMs < making.nowMs, facts: [{ bottle: bottle.id, fact: details[what] }] });
}

function leaning(making: Making, bottle: string, mixAction: string): boolean {
  return making.history.steps.some(
    (step) =>
      step.kind === 'act' &&
      step.actionId !== mixAction &&
      !making.voided.has(step.actionId) &&
      step.facts.some((each) => each.bottle === bottle),
  );
}

function withdraw(making: Making): void {
  const { by, history, voided } = making;
  const candidates = history.steps.filter((step): step is HistoryAct => {
    if (step.kind !== 'act' || voided.has(step.actionId)) return false;
    const mixed = step.what === 'mix' ? step.facts[0]?.bottle : undefined;
    return mixed === undefined || !leaning(making, mixed, step.actionId);
  });
  const chosen = by.pickAny(candidates);
  if (!chosen) return;
  voided.add(chosen.actionId);
  making.standing = making.standing.filter((bottle) => bottle.mixAction !== chosen.actionId);
  history.steps.push({
    kind: 'void',
    actionId: seededId(making.nowMs, by),
    happenedAt: new Date(making.nowMs).toISOString(),
    voids: chosen.actionId,
  });
}

function step(making: Making): void {
  const { by, standing } = making;
  // Now and then two things are told for the very same instant: only their sequence orders them.
  if (!by.percent(10)) making.nowMs += by.percent(30) ? by.between(1, 12) * DAY : by.between(1, 600) * MINUTE;
  if (standing.length === 0 || (standing.length < 4 && by.percent(12))) mix(making);
  else if (by.percent(15)) withdraw(making);
  else if (by.percent(55)) load(making);
  else befall(making);
}

/** A random history of up to four bottles at a time, the same for the same seed and reach. */
export function generateHistory(
  seed: number,
  steps = 60,
  zone = 'Europe/Prague',
  reach: Reach = 'everything',
): History {
  const by = chance(seed);
  const history: History = { seed, zone, bottles: [], steps: [] };
  const nowMs = Date.UTC(2026, by.between(0, 11), by.between(1, 28), by.between(0, 23));
  const making: Making = { by, reach, history, nowMs, seq: 0, standing: [], voided: new Set() };
  for (let done = 0; done < steps; done += 1) step(making);
  return history;
}

/** The chemistry of one of its bottles. */
export function documentOf(history: History, bottle: string): ChemistryDocument {
  return starterDocument(history.bottles.find((each) => each.id === bottle)?.documentKey ?? '');
}

/** What one bottle's ledger holds after those steps, with the voids marked, in the order of recording. */
export function factsOf(steps: readonly HistoryStep[], bottle: string): BottleFact[] {
  const voids = new Set(steps.filter((one) => one.kind === 'void').map((one) => one.voids));
  return steps
    .filter((one) => one.kind === 'act')
    .flatMap((act) => act.facts.filter((each) => each.bottle === bottle))
    .map(({ fact }) => (voids.has(fact.actionId) ? { ...fact, voided: true } : fact));
}
