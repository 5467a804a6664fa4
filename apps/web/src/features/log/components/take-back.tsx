import { Button } from '@chakra-ui/react';
import { useState } from 'react';
import { newId } from '../../../shared/actions/send-action.js';
import { useVoid } from '../../../shared/actions/use-void.js';
import type { LogEntry } from '../../../shared/api/types.js';
import { reckonedNow } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ReasonSheet } from '../../../shared/ui/reason-sheet.js';

/** For so long one's own deed is simply undone; after that a technician voids it, and says why. */
const UNDO_MS = 12 * 3_600_000;

/** The way back from something that happened: both stay in the log. */
export function TakeBack({ entry: { action, sentence } }: { entry: LogEntry }) {
  const { me } = useDarkroom();
  const voiding = useVoid();
  const [asking, setAsking] = useState(false);
  const isOwn = action.by.membershipId === me.membershipId;
  const isFresh = Date.parse(reckonedNow()) - Date.parse(action.recordedAt) < UNDO_MS;
  const content = { voidedActionId: action.id };
  const said = { words: `Undone: ${sentence}.`, canUndo: false };
  if (isOwn && isFresh) {
    return (
      <Button
        variant="outline"
        minH="11"
        aria-label={`Undo: ${sentence}`}
        onClick={() => voiding.send(newId(), content, said)}
      >
        Undo
      </Button>
    );
  }
  return (
    <>
      <Button
        variant="plain"
        minH="11"
        minW="11"
        px="1"
        textDecoration="underline"
        aria-label={`Void: ${sentence}`}
        onClick={() => setAsking(true)}
      >
        Void
      </Button>
      {asking && (
        <ReasonSheet
          open
          onClose={() => setAsking(false)}
          title="Void"
          label={`Why ${action.by.displayName}’s “${sentence}” is taken off`}
          missing="Say why: it stays in the log."
          suggestions={[]}
          button="Void it"
          onConfirm={(actionId, reason) => voiding.sendFromSheet(actionId, { ...content, reason }, said)}
        />
      )}
    </>
  );
}
