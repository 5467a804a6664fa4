import { useAction } from '../../../shared/actions/use-action.js';
import type { ActionAnswer } from '../../../shared/api/types.js';

export interface SettingChangeContent {
  subject: 'supplier-pack';
  subjectId: string;
  changes: { field: 'outUntil'; value: string | null }[];
}

/** Notes that a supplier is out of a pack until a date, or has it again. A technician's. */
export const usePutSettingChange = () =>
  useAction<SettingChangeContent, ActionAnswer>({
    plural: 'setting-changes',
    touches: ['suppliers', 'shelf', 'needs-you', 'log'],
  });
