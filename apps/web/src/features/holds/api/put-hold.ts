import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import type { BottleAnswer } from '../../../shared/api/types.js';

export interface HoldContent {
  bottleId: string;
  reason: string;
}

/** Takes a bottle out of use, with a reason. Any member may. */
export const usePutHold = () =>
  useAction<HoldContent, BottleAnswer>({
    plural: 'holds',
    changes: ({ bottleId, reason }) => [{ bottleId, fact: { kind: 'hold', reason } }],
    settle: (client, darkroom, { bottle }) => settleBottles(client, darkroom, [bottle]),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
