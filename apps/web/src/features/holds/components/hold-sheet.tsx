import type { BottleView } from '../../../shared/api/types.js';
import { usePutHold } from '../api/put-hold.js';
import { ReasonSheet } from '../../../shared/ui/reason-sheet.js';

const suggestions = ['smells wrong', 'wrong colour', 'poured back into the wrong bottle'];

export function HoldSheet({
  bottle,
  open,
  onClose,
}: {
  bottle: BottleView;
  open: boolean;
  onClose: () => void;
}) {
  const hold = usePutHold();
  return (
    <ReasonSheet
      open={open}
      onClose={onClose}
      title={`Hold ${bottle.code}`}
      label="What is wrong with it"
      missing="Say what is wrong, for whoever looks at it next."
      suggestions={suggestions}
      button={`Put ${bottle.code} on hold`}
      onConfirm={(actionId, reason) =>
        hold.sendFromSheet(
          actionId,
          { bottleId: bottle.id, reason },
          { words: `${bottle.code} is on hold.`, undone: `${bottle.code} is not on hold.` },
        )
      }
    />
  );
}
