import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { MixAnswer, MixContent } from '../../../shared/api/types.js';

/** Records a new bottle, and takes what went into it from the shelf. A technician's. */
export const usePutMix = () =>
  useAction<MixContent & { happenedAt?: string }, MixAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/mixes/{actionId}', { params: { path }, body })),
    touches: ['bottles', 'chemistries', 'shelf', 'log', 'needs-you'],
  });
