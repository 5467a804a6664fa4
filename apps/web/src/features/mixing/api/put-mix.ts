import { useAction } from '../../../shared/actions/use-action.js';
import type { MixAnswer, MixContent } from '../../../shared/api/types.js';

/** Records a new bottle, and takes what went into it from the shelf. A technician's. */
export const usePutMix = () =>
  useAction<MixContent & { happenedAt?: string }, MixAnswer>({
    plural: 'mixes',
    touches: ['bottles', 'chemistries', 'shelf', 'log', 'needs-you'],
  });
