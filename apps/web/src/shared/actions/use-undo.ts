import { newId } from './send-action.js';
import type { Strip } from './strip.store.js';
import { useVoid } from './use-void.js';

/** Undoes what the strip speaks of. */
export function useUndo(): (done: Strip) => void {
  const voiding = useVoid();
  return ({ actionId, undone, canUndo }) => {
    if (!canUndo) return;
    voiding.send(newId(), { voidedActionId: actionId }, { words: undone ?? 'Undone.', canUndo: false });
  };
}
