import { Button, Flex, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../actions/send-action.js';
import { FormError } from './form-error.js';
import { showProblem } from './form-problem.js';
import { Sheet } from './sheet.js';
import { reasonRules, TextAreaField } from './text-field.js';

interface Props {
  open: boolean;
  onClose: () => void;
  title: string;
  label: string;
  /** What is wrong when nothing is written. */
  missing: string;
  suggestions: readonly string[];
  button: string;
  /** Rejects when the server says no: the sheet then stays open with what was typed. */
  onConfirm: (actionId: string, reason: string) => Promise<void>;
}

function ReasonForm({ label, missing, suggestions, button, onConfirm, onClose }: Props) {
  const [actionId] = useState(newId);
  const { register, handleSubmit, setValue, setError, formState } = useForm({
    defaultValues: { reason: '' },
  });
  const confirm = handleSubmit(async ({ reason }) => {
    try {
      await onConfirm(actionId, reason.trim());
      onClose();
    } catch (error) {
      showProblem(error, setError, (field) => (field === 'reason' ? 'reason' : null));
    }
  });
  return (
    <form onSubmit={(event) => void confirm(event)} noValidate>
      <Stack gap="4">
        {suggestions.length > 0 && (
          <Flex wrap="wrap" gap="2" role="group" aria-label="Suggestions">
            {suggestions.map((words) => (
              <Button
                key={words}
                variant="outline"
                minH="11"
                onClick={() => setValue('reason', words, { shouldValidate: true })}
              >
                {words}
              </Button>
            ))}
          </Flex>
        )}
        <TextAreaField
          label={label}
          error={formState.errors.reason?.message}
          {...register('reason', reasonRules(missing))}
        />
        <FormError message={formState.errors.root?.message} />
        <Button
          type="submit"
          minH="13"
          whiteSpace="normal"
          loading={formState.isSubmitting}
          loadingText="Recording"
        >
          {button}
        </Button>
      </Stack>
    </form>
  );
}

/** Asks why, then does it. */
export function ReasonSheet(props: Props) {
  return (
    <Sheet open={props.open} onClose={props.onClose} title={props.title}>
      <ReasonForm {...props} />
    </Sheet>
  );
}
