import { type Container, containerState } from './container.js';
import { addDays } from './dates.js';
import type { ChemistryDocument } from './document.js';
import { compare, fromText, one } from './fraction.js';
import type { BottleFact, BottleTotals, PerMaterialE4, TransferIn } from './ledger.js';

function fresh(fact: BottleFact, volumeUl: number, container: Container): BottleTotals {
  return {
    usedE4: {},
    volumeUl,
    ratedVolumeUl: volumeUl,
    container,
    containerState: containerState(container, volumeUl),
    stateSince: fact.happenedOn,
    lifeUsed: { num: '0', den: '1' },
    useLifeUsed: { num: '0', den: '1' },
    endedOn: null,
    material: null,
    mixedOn: fact.happenedOn,
    firstUsedOn: null,
    readyAt: null,
    about: false,
    ceilingE4: {},
    replenishedUl: 0,
    hold: null,
    discardedAt: null,
    lastActionId: fact.actionId,
    lastHappenedAt: fact.happenedAt,
    lastSeq: fact.seq,
    lastPart: fact.part ?? 0,
    loads: 0,
  };
}

const anyUsed = (usedE4: PerMaterialE4): boolean => Object.values(usedE4).some((amount) => amount > 0);

function fromAnother(fact: BottleFact & TransferIn): BottleTotals | null {
  if (!fact.opens) return null;
  const bottle = fresh(fact, fact.volumeUl, fact.opens.container);
  const over = fact.lifeUsed !== undefined && compare(fromText(fact.lifeUsed), one) > 0;
  return {
    ...bottle,
    ratedVolumeUl: fact.ratedVolumeUl ?? fact.volumeUl,
    usedE4: { ...fact.usedE4 },
    ceilingE4: { ...fact.ceilingE4 },
    material: fact.opens.material,
    mixedOn: fact.mixedOn ?? fact.happenedOn,
    firstUsedOn: fact.firstUsedOn ?? null,
    lifeUsed: fact.lifeUsed ?? bottle.lifeUsed,
    useLifeUsed: fact.useLifeUsed ?? bottle.useLifeUsed,
    endedOn: over ? addDays(fact.happenedOn, -1) : null,
    about: fact.about ?? false,
    readyAt: fact.opens.readyAt ?? null,
  };
}

/** The bottle as the fact first puts it there, or null for a fact that opens none. */
export function openBottle(document: ChemistryDocument, fact: BottleFact): BottleTotals | null {
  if (fact.kind === 'transfer-in') return fromAnother(fact);
  if (fact.kind !== 'mix' && fact.kind !== 'standing') return null;
  const waits = document.readyAfter && fact.kind === 'mix' ? document.readyAfter.seconds : null;
  const bottle: BottleTotals = {
    ...fresh(fact, fact.volumeUl, fact.container),
    material: fact.material,
    readyAt:
      fact.readyAt ??
      (waits === null ? null : new Date(Date.parse(fact.happenedAt) + waits * 1_000).toISOString()),
  };
  if (fact.kind === 'mix') return bottle;
  return {
    ...bottle,
    about: true,
    mixedOn: fact.mixedOn,
    // How it stood before is not known; the state it is found in counts from its mixing.
    stateSince: fact.mixedOn,
    usedE4: { ...fact.usedE4 },
    firstUsedOn: fact.firstUsedOn ?? (anyUsed(fact.usedE4) ? fact.mixedOn : null),
  };
}
