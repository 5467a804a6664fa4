import { Button, Flex, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../actions/send-action.js';
import { Sheet } from './sheet.js';
import { TextAreaField } from './text-field.js';

interface Props {
  open: boolean;
  onClose: () => void;
  title: string;
  label: string;
  /** What is wrong when nothing is written. */
  missing: string;
  suggestions: readonly string[];
  button: string;
  onConfirm: (actionId: string, reason: string) => void;
}

function ReasonForm({ label, missing, suggestions, button, onConfirm, onClose }: Props) {
  const [actionId] = useState(newId);
  const { register, handleSubmit, setValue, formState } = useForm({ defaultValues: { reason: '' } });
  const confirm = handleSubmit(({ reason }) => {
    onConfirm(actionId, reason.trim());
    onClose();
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
          {...register('reason', { validate: (text) => text.trim() !== '' || missing })}
        />
        <Button type="submit" minH="13" whiteSpace="normal">
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
