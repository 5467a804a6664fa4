import { Button, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../../../shared/actions/send-action.js';
import { useVoid } from '../../../shared/actions/use-void.js';
import type { NeedsYouRow } from '../../../shared/api/types.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { showProblem } from '../../../shared/ui/form-problem.js';
import { Sheet } from '../../../shared/ui/sheet.js';
import { reasonRules, TextAreaField } from '../../../shared/ui/text-field.js';
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
  const { register, handleSubmit, setError, formState } = useForm({ defaultValues: { reason: '' } });
  const { errors, isSubmitting } = formState;
  const [pressed, setPressed] = useState<'accept' | 'void'>('accept');
  const decide = (button: 'accept' | 'void', send: (reason: string) => Promise<void>) =>
    handleSubmit(async ({ reason }) => {
      setPressed(button);
      try {
        await send(reason.trim());
        onClose();
      } catch (error) {
        showProblem(error, setError, (field) => (field === 'reason' ? 'reason' : null));
      }
    });
  const accept = decide('accept', (reason) =>
    decision.sendFromSheet(
      ids.accept,
      { loadActionId: load.actionId, decision: 'accept', reason },
      { words: `The load of ${load.by} stands.` },
    ),
  );
  const voidIt = decide('void', (reason) =>
    voiding.sendFromSheet(
      ids.voided,
      { voidedActionId: load.actionId, reason },
      { words: `The load of ${load.by} is voided.`, canUndo: false },
    ),
  );
  return (
    <form onSubmit={(event) => void accept(event)} noValidate>
      <Stack gap="4">
        <p>
          {load.by}: {load.sentence}. It counts already; accepting it changes no number, voiding it takes it
          off.
        </p>
        <TextAreaField
          label="Why"
          error={errors.reason?.message}
          {...register('reason', reasonRules('Say why: it stays in the log.'))}
        />
        <FormError message={errors.root?.message} />
        <Button
          type="submit"
          minH="13"
          disabled={isSubmitting}
          loading={isSubmitting && pressed === 'accept'}
          loadingText="Recording"
        >
          Accept the load
        </Button>
        <Button
          variant="outline"
          minH="13"
          disabled={isSubmitting}
          loading={isSubmitting && pressed === 'void'}
          loadingText="Recording"
          onClick={() => void voidIt()}
        >
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
