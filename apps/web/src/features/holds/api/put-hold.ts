import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { BottleActionAnswer, HoldContent } from '../../../shared/api/types.js';

/** Takes a bottle out of use, with a reason. Any member may. */
export const usePutHold = () =>
  useAction<HoldContent, BottleActionAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/holds/{actionId}', { params: { path }, body })),
    changes: ({ bottleId, reason }) => [{ bottleId, fact: { kind: 'hold', reason } }],
    settle: (client, darkroom, { bottle }) => settleBottles(client, darkroom, [bottle]),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
