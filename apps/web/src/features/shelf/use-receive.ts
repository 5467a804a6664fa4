import { useState } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { newId } from '../../shared/actions/send-action.js';
import { showStrip } from '../../shared/actions/strip.store.js';
import { ProblemError } from '../../shared/api/problem.js';
import type { ReceiptAnswer } from '../../shared/api/types.js';
import { countOf } from '../../shared/formats/amounts.js';
import { showProblem } from '../../shared/ui/form-problem.js';
import { usePutReceipt } from './api/put-receipt.js';
import { fieldOfReceipt, type ReceiptForm, receiptLines, rowsOverOrder } from './receipt-form.js';

/** More came than was ordered: in which rows, and what all of them said then. */
interface Asked {
  rows: readonly number[];
  counts: string;
}
const NOBODY: Asked = { rows: [], counts: '' };
const countsIn = ({ rows }: ReceiptForm): string => rows.map(({ count }) => count.trim()).join(' ');

/** Sends what came, once, and puts the server's objections into the form. `over`: the rows to ask about. */
export function useReceive(form: UseFormReturn<ReceiptForm>, orderId: string | null) {
  const receipt = usePutReceipt();
  const [actionId, setActionId] = useState(newId);
  const [asked, setAsked] = useState(NOBODY);

  const receive = async (filled: ReceiptForm): Promise<ReceiptAnswer | null> => {
    const lines = receiptLines(filled.rows);
    if (lines.length === 0) {
      form.setError('root', { message: 'Say of one pack at least how many came.' });
      return null;
    }
    // The answer holds for the counts it was given to; another count is asked about anew.
    const isRight =
      asked.rows.length > 0 &&
      asked.counts === countsIn(filled) &&
      asked.rows.every((row) => filled.rows[row]?.moreIsRight);
    const content = {
      ...(orderId && { orderId }),
      lines,
      ...(filled.note.trim() && { note: filled.note.trim() }),
      ...(isRight && { overDeliveryOk: true }),
    };
    try {
      const answer = await receipt.sendAndWait(actionId, content);
      const packs = lines.reduce((sum, line) => sum + line.count, 0);
      const verb = packs === 1 ? 'is' : 'are';
      showStrip({
        actionId,
        state: 'done',
        words: `${countOf(packs, 'pack')} ${verb} on the shelf.`,
        canUndo: true,
      });
      setActionId(newId());
      setAsked(NOBODY);
      return answer;
    } catch (error) {
      if (error instanceof ProblemError && error.code === 'more-than-ordered') {
        const fields = error.fields.map(({ field }) => field.replace(/^content\./, ''));
        const rows = rowsOverOrder(fields, filled.rows);
        if (asked.counts !== countsIn(filled))
          for (const row of rows) form.setValue(`rows.${row}.moreIsRight`, false);
        setAsked({ rows, counts: countsIn(filled) });
      }
      showProblem(error, form.setError, (field) => fieldOfReceipt(field, filled.rows));
      return null;
    }
  };
  return { receive, over: asked.rows, isPending: receipt.isPending };
}
