import { useMemo } from 'react';
import type { BottleList, BottlePageData } from '../../shared/api/types.js';
import { overlay } from '../../shared/actions/overlay.js';
import { pendingActions } from '../../shared/actions/pending.store.js';
import { useNow } from '../../shared/clock/use-now.js';
import { useDarkroom } from '../../shared/darkroom/darkroom-context.js';
import { useStore } from '../../shared/store.js';
import { inLineOrder } from './line-order.js';
import { type Standing, standingOf } from './standing.js';

/** The bottles as they stand with what has just been done here, in the order film goes through them. */
export function useStandings(list: BottleList | undefined): Standing[] {
  const darkroom = useDarkroom();
  const now = useNow();
  const pending = useStore(pendingActions);
  return useMemo(() => {
    const standings = (list?.bottles ?? []).flatMap((bottle) => {
      const document = list?.versions[bottle.chemistryVersionId];
      if (!document) return [];
      return [standingOf(overlay(bottle, document, pending, darkroom.zone), document, darkroom, now)];
    });
    return inLineOrder(standings);
  }, [list, pending, darkroom, now]);
}

export function useStanding({ bottle, document }: BottlePageData): Standing {
  const darkroom = useDarkroom();
  const now = useNow();
  const pending = useStore(pendingActions);
  return standingOf(overlay(bottle, document, pending, darkroom.zone), document, darkroom, now);
}
