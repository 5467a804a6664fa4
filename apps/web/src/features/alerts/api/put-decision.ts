import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { ActionAnswer, DecisionContent } from '../../../shared/api/types.js';

/** Lets a reported load stand, with a reason. It changes no count. A technician's. */
export const usePutDecision = () =>
  useAction<DecisionContent, ActionAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/decisions/{actionId}', { params: { path }, body })),
    touches: ['needs-you', 'log', 'bottle'],
  });
