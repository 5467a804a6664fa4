import { useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { newId } from '../../shared/actions/send-action.js';
import { showStrip } from '../../shared/actions/strip.store.js';
import { wordsOf } from '../../shared/api/problem.js';
import { useDarkroom } from '../../shared/darkroom/darkroom-context.js';
import { paths } from '../../shared/routes/paths.js';
import { usePutOrderDraft } from './api/put-order-draft.js';

/** Begins a draft at a supplier and goes to it. */
export function useDraftOrder() {
  const { address } = useDarkroom();
  const navigate = useNavigate();
  const draft = usePutOrderDraft();
  const ids = useRef({ actionId: newId(), orderId: newId() });
  const [problem, setProblem] = useState<string | null>(null);
  const begin = async (
    supplierId: string,
    wanted: readonly { supplierPackId: string; count: number }[],
  ): Promise<void> => {
    const { actionId, orderId } = ids.current;
    setProblem(null);
    try {
      const lines = wanted.map((line) => ({ id: newId(), ...line }));
      const { order } = await draft.sendAndWait(actionId, { orderId, supplierId, lines });
      ids.current = { actionId: newId(), orderId: newId() };
      await navigate(paths.order(address, order.id));
      showStrip({ actionId, state: 'done', words: `Draft ${order.numberText} is begun.`, canUndo: false });
    } catch (error) {
      ids.current = { actionId: newId(), orderId: newId() };
      setProblem(wordsOf(error));
    }
  };
  return { begin, problem, isPending: draft.isPending };
}
