import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import type { BottleAnswer } from '../../../shared/api/types.js';
import type { HoldContent } from './put-hold.js';

/** Gives a held bottle back to the sink. A technician's. */
export const usePutRelease = () =>
  useAction<HoldContent, BottleAnswer>({
    plural: 'releases',
    changes: ({ bottleId }) => [{ bottleId, fact: { kind: 'release' } }],
    settle: (client, darkroom, { bottle }) => settleBottles(client, darkroom, [bottle]),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
