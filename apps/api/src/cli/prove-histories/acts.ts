import type { INestApplicationContext } from '@nestjs/common';
import type { History, HistoryAct, HistoryStep } from '@wetside/chemistry/testing';
import type { ActionKind } from '@wetside/db';
import { HoldsService } from '../../features/holds/holds.service.js';
import { LoadsService } from '../../features/loads/loads.service.js';
import type { MixContentDto } from '../../features/mixes/mix.dto.js';
import { MixesService } from '../../features/mixes/mixes.service.js';
import { VoidsService } from '../../features/voids/voids.service.js';
import type { HistoryHouse } from './house.js';

/** Tells the program one step of a history at that moment. @returns the server's place of it in the order */
export async function tell(
  app: INestApplicationContext,
  house: HistoryHouse,
  history: History,
  step: HistoryStep,
  now: string,
): Promise<number> {
  const { enter } = house;
  if (step.kind === 'void') {
    const put = putOf('void', step.actionId, now, step.happenedAt, {
      voidedActionId: step.voids,
      reason: 'misread',
    });
    return (await app.get(VoidsService).put(enter, put)).body.action.seq;
  }
  const [first] = step.facts;
  if (!first) throw new Error('An act without facts tells nothing.');
  const { bottle: bottleId, fact } = first;
  const put = <C extends object>(content: C) =>
    putOf(step.what as ActionKind, step.actionId, now, step.toldAt ?? fact.happenedAt, content);
  switch (step.what) {
    case 'mix':
      return (await app.get(MixesService).put(enter, put(mixOf(house, history, step)))).body.action.seq;
    case 'load':
      return (await app.get(LoadsService).put(enter, put(loadOf(step)))).body.action.seq;
    case 'hold':
    case 'release': {
      const reason = fact.kind === 'hold' ? fact.reason : 'clear again';
      return (await app.get(HoldsService)[step.what](enter, put({ bottleId, reason }))).body.action.seq;
    }
    case 'discard': {
      const content = { bottleId, wasteRoute: 'fixer-silver' as const };
      return (await app.get(HoldsService).discard(enter, put(content))).body.action.seq;
    }
    default:
      throw new Error(`The program does not record a ${step.what} yet.`);
  }
}

function putOf<C extends object>(kind: ActionKind, id: string, now: string, happenedAt: string, detail: C) {
  const content = { v: 1, happenedAt, ...detail };
  return { id, kind, content, raw: content, envelope: { deviceNow: now, queued: false } };
}

function mixOf(
  house: HistoryHouse,
  history: History,
  { facts }: HistoryAct,
): Omit<MixContentDto, 'v' | 'happenedAt'> {
  const [made, drawn] = facts;
  if (made?.fact.kind !== 'mix') throw new Error('A mix begins with the bottle that it makes.');
  const { bottle: bottleId, fact } = made;
  const key = history.bottles.find(({ id }) => id === bottleId)?.documentKey ?? '';
  return {
    bottleId,
    chemistryVersionId: house.versionIdOf(key),
    volumeUl: fact.volumeUl,
    container: fact.container,
    material: fact.material,
    from: drawn ? { kind: 'stock', bottleId: drawn.bottle } : { kind: 'hand' },
  };
}

function loadOf({ facts, film }: HistoryAct) {
  if (!film) throw new Error('A load without film is none.');
  return { bottleIds: facts.map(({ bottle }) => bottle), material: 'film' as const, film: [film] };
}
