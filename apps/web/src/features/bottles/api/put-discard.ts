import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { BottleActionAnswer, DiscardContent } from '../../../shared/api/types.js';

/** Ends a bottle and says where its contents went. A technician's. */
export const usePutDiscard = () =>
  useAction<DiscardContent, BottleActionAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/discards/{actionId}', { params: { path }, body })),
    changes: ({ bottleId }) => [{ bottleId, fact: { kind: 'discard' } }],
    settle: (client, darkroom, { bottle }) => settleBottles(client, darkroom, [bottle]),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
