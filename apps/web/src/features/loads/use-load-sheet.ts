import { useRef, useState } from 'react';
import { newId } from '../../shared/actions/send-action.js';
import { deviceMs } from '../../shared/clock/web-clock.js';

export interface OpenLoad {
  /** The id of the load, made now, so that however often it is confirmed it is one load. */
  actionId: string;
  bottleIds: readonly string[];
  /** Opened by 'it has been through already'. */
  reported: boolean;
}

/** For so long after closing, a second tap of a double tap opens nothing. */
const GUARD_MS = 800;

export function useLoadSheet() {
  const [load, setLoad] = useState<OpenLoad | null>(null);
  const [wasOpened, setWasOpened] = useState(false);
  const closedAtMs = useRef<number | null>(null);
  return {
    load,
    /** Once opened it stays in the page, so that its closing is drawn. */
    wasOpened,
    open: (bottleIds: readonly string[], reported = false): void => {
      if (closedAtMs.current !== null && deviceMs() - closedAtMs.current < GUARD_MS) return;
      setWasOpened(true);
      setLoad({ actionId: newId(), bottleIds, reported });
    },
    close: (): void => {
      closedAtMs.current = deviceMs();
      setLoad(null);
    },
  };
}
export type LoadSheetState = ReturnType<typeof useLoadSheet>;
