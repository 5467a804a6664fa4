import { Button, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../../../shared/actions/send-action.js';
import { useVoid } from '../../../shared/actions/use-void.js';
import type { NeedsYouRow } from '../../../shared/api/types.js';
import { Sheet } from '../../../shared/ui/sheet.js';
import { TextAreaField } from '../../../shared/ui/text-field.js';
import { usePutDecision } from '../api/put-decision.js';

interface Props {
  load: NonNullable<NeedsYouRow['load']>;
  open: boolean;
  onClose: () => void;
}

function DecideForm({ load, onClose }: Props) {
  const [ids] = useState(() => ({ accept: newId(), voided: newId() }));
  const decision = usePutDecision();
  const voiding = useVoid();
  const { register, handleSubmit, formState } = useForm({ defaultValues: { reason: '' } });
  const accept = handleSubmit(({ reason }) => {
    const content = { loadActionId: load.actionId, decision: 'accept' as const, reason: reason.trim() };
    decision.send(ids.accept, content, { words: `The load of ${load.by} stands.` });
    onClose();
  });
  const voidIt = handleSubmit(({ reason }) => {
    const content = { voidedActionId: load.actionId, reason: reason.trim() };
    voiding.send(ids.voided, content, { words: `The load of ${load.by} is voided.`, canUndo: false });
    onClose();
  });
  return (
    <form onSubmit={(event) => void accept(event)} noValidate>
      <Stack gap="4">
        <p>
          {load.by}: {load.sentence}. It counts already; accepting it changes no number, voiding it takes it
          off.
        </p>
        <TextAreaField
          label="Why"
          error={formState.errors.reason?.message}
          {...register('reason', {
            validate: (text) => text.trim() !== '' || 'Say why: it stays in the log.',
          })}
        />
        <Button type="submit" minH="13">
          Accept the load
        </Button>
        <Button variant="outline" minH="13" onClick={() => void voidIt()}>
          Void the load
        </Button>
      </Stack>
    </form>
  );
}

/** A reported load: let it stand, or take it off. */
export function DecideSheet(props: Props) {
  return (
    <Sheet open={props.open} onClose={props.onClose} title="Decide">
      <DecideForm {...props} />
    </Sheet>
  );
}
