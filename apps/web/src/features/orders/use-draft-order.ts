import { useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { newId } from '../../shared/actions/send-action.js';
import { showStrip } from '../../shared/actions/strip.store.js';
import { isUncertain, wordsOf } from '../../shared/api/problem.js';
import { useDarkroom } from '../../shared/darkroom/darkroom-context.js';
import { paths } from '../../shared/routes/paths.js';
import { usePutOrderDraft } from './api/put-order-draft.js';

interface Wanted {
  supplierPackId: string;
  count: number;
}
const newDraft = () => ({ actionId: newId(), orderId: newId(), lineIds: new Map<string, string>() });

/** Begins a draft at a supplier and goes to it. */
export function useDraftOrder() {
  const { address } = useDarkroom();
  const navigate = useNavigate();
  const draft = usePutOrderDraft();
  const ids = useRef(newDraft());
  const [problem, setProblem] = useState<string | null>(null);
  const begin = async (supplierId: string, wanted: readonly Wanted[]): Promise<void> => {
    const { actionId, orderId, lineIds } = ids.current;
    setProblem(null);
    try {
      const lines = wanted.map((line) => {
        const id = lineIds.get(line.supplierPackId) ?? newId();
        lineIds.set(line.supplierPackId, id);
        return { id, ...line };
      });
      const { order } = await draft.sendAndWait(actionId, { orderId, supplierId, lines });
      ids.current = newDraft();
      await navigate(paths.order(address, order.id));
      showStrip({ actionId, state: 'done', words: `Draft ${order.numberText} is begun.`, canUndo: false });
    } catch (error) {
      // Pressed again while nobody knows whether it arrived, it is the same draft.
      if (!isUncertain(error)) ids.current = newDraft();
      setProblem(wordsOf(error));
    }
  };
  return { begin, problem, isPending: draft.isPending };
}
