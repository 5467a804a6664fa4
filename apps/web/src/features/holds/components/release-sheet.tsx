import type { BottleView } from '../../../shared/api/types.js';
import { usePutRelease } from '../api/put-release.js';
import { ReasonSheet } from '../../../shared/ui/reason-sheet.js';

export function ReleaseSheet({
  bottle,
  open,
  onClose,
}: {
  bottle: BottleView;
  open: boolean;
  onClose: () => void;
}) {
  const release = usePutRelease();
  return (
    <ReasonSheet
      open={open}
      onClose={onClose}
      title={`Release ${bottle.code}`}
      label="Why it may be used again"
      missing="Say why: what you looked at or tested."
      suggestions={[]}
      button={`Release ${bottle.code}`}
      onConfirm={(actionId, reason) =>
        release.sendFromSheet(
          actionId,
          { bottleId: bottle.id, reason },
          { words: `${bottle.code} is released.` },
        )
      }
    />
  );
}
