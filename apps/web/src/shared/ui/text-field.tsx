import { Box, Field, Flex, Input, NativeSelect, Textarea } from '@chakra-ui/react';
import type { ComponentProps, ReactNode } from 'react';

interface FieldProps {
  label: string;
  error?: string | undefined;
  help?: ReactNode;
  children: ReactNode;
}

/** Label above, help and error below. */
export function FormField({ label, error, help, children }: FieldProps) {
  return (
    <Field.Root invalid={error !== undefined} gap="1" minW="0">
      <Field.Label fontWeight="600" fontSize="text">
        {label}
      </Field.Label>
      {children}
      {help && (
        <Field.HelperText color="ink.muted" fontSize="small">
          {help}
        </Field.HelperText>
      )}
      <Field.ErrorText fontSize="small">{error}</Field.ErrorText>
    </Field.Root>
  );
}

type TextFieldProps = Omit<FieldProps, 'children'> & ComponentProps<typeof Input> & { unit?: string };

/** One line of text or a number; its unit stands inside the field. */
export function TextField({ label, error, help, unit, ...input }: TextFieldProps) {
  return (
    <FormField label={label} error={error} help={help}>
      <Flex align="center" w="100%" position="relative">
        <Input
          minH="11"
          bg="surface"
          borderColor="field"
          dir="auto"
          pr={unit ? '16' : undefined}
          {...input}
        />
        {unit && (
          <Box as="span" position="absolute" right="3" color="ink.muted" aria-hidden="true">
            {unit}
          </Box>
        )}
      </Flex>
    </FormField>
  );
}

/** The most that the server takes of a reason, in characters. */
const REASON_MOST = 300;

/** A reason is asked for, and has an end. */
export const reasonRules = (missing: string, most = REASON_MOST) => ({
  validate: (text: string): true | string => {
    const length = text.trim().length;
    if (length === 0) return missing;
    return length <= most || `${most} characters at the most; this is ${length}.`;
  },
});

type TextAreaFieldProps = Omit<FieldProps, 'children'> & ComponentProps<typeof Textarea>;

export function TextAreaField({ label, error, help, ...area }: TextAreaFieldProps) {
  return (
    <FormField label={label} error={error} help={help}>
      <Textarea bg="surface" borderColor="field" rows={2} dir="auto" {...area} />
    </FormField>
  );
}

type SelectFieldProps = Omit<FieldProps, 'children'> &
  ComponentProps<typeof NativeSelect.Field> & { options: readonly { value: string; label: string }[] };

export function SelectField({ label, error, help, options, ...select }: SelectFieldProps) {
  return (
    <FormField label={label} error={error} help={help}>
      <NativeSelect.Root>
        <NativeSelect.Field minH="11" bg="surface" borderColor="field" {...select}>
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </NativeSelect.Field>
        <NativeSelect.Indicator />
      </NativeSelect.Root>
    </FormField>
  );
}
