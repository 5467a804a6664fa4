import { useAction } from '../../../shared/actions/use-action.js';
import type { ActionAnswer } from '../../../shared/api/types.js';

export interface DecisionContent {
  loadActionId: string;
  decision: 'accept';
  reason: string;
}

/** Lets a reported load stand, with a reason. It changes no count. A technician's. */
export const usePutDecision = () =>
  useAction<DecisionContent, ActionAnswer>({ plural: 'decisions', touches: ['needs-you', 'log', 'bottle'] });
