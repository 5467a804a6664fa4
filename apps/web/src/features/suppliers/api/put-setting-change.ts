import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { ActionAnswer, SettingChangeContent } from '../../../shared/api/types.js';

/** Notes that a supplier is out of a pack until a date, or has it again. A technician's. */
export const usePutSettingChange = () =>
  useAction<SettingChangeContent, ActionAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/setting-changes/{actionId}', { params: { path }, body })),
    touches: ['suppliers', 'shelf', 'needs-you', 'log'],
  });
