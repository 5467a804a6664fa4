import type { WasteRoute } from '@wetside/chemistry';
import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import type { BottleAnswer } from '../../../shared/api/types.js';

export interface DiscardContent {
  bottleId: string;
  wasteRoute: WasteRoute;
  note?: string;
}

/** Ends a bottle and says where its contents went. A technician's. */
export const usePutDiscard = () =>
  useAction<DiscardContent, BottleAnswer>({
    plural: 'discards',
    changes: ({ bottleId }) => [{ bottleId, fact: { kind: 'discard' } }],
    settle: (client, darkroom, { bottle }) => settleBottles(client, darkroom, [bottle]),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
