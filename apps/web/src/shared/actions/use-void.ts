import { answered, api } from '../api/client.js';
import type { VoidAnswer, VoidContent } from '../api/types.js';
import { settleBottles } from './settle-bottles.js';
import { beforeOf } from './undo-memory.js';
import { useAction } from './use-action.js';

/** Undo: a void action. Nothing is deleted; both stay in the log. */
export const useVoid = () =>
  useAction<VoidContent, VoidAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/voids/{actionId}', { params: { path }, body })),
    restores: ({ voidedActionId }) => ({ actionId: voidedActionId, before: beforeOf(voidedActionId) }),
    settle: (client, darkroom, { bottles }) => settleBottles(client, darkroom, bottles),
    touches: [
      'bottles',
      'bottle',
      'log',
      'needs-you',
      'shelf',
      'orders',
      'order',
      'chemistries',
      'suppliers',
    ],
  });
