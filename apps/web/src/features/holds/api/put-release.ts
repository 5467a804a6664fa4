import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { BottleActionAnswer, HoldContent } from '../../../shared/api/types.js';

/** Gives a held bottle back to the sink. A technician's. */
export const usePutRelease = () =>
  useAction<HoldContent, BottleActionAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/releases/{actionId}', { params: { path }, body })),
    changes: ({ bottleId }) => [{ bottleId, fact: { kind: 'release' } }],
    settle: (client, darkroom, { bottle }) => settleBottles(client, darkroom, [bottle]),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
