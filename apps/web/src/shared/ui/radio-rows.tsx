import { Box, chakra, Stack } from '@chakra-ui/react';
import { type ComponentProps, useId } from 'react';
import { ShapeMark } from './state-mark.js';

interface Props extends Pick<ComponentProps<'input'>, 'name' | 'ref' | 'onChange' | 'onBlur'> {
  legend: string;
  options: readonly { value: string; label: string; note?: string; isPast?: boolean }[];
  error?: string | undefined;
}

const Row = chakra('label', {
  base: { display: 'flex', gap: '3', alignItems: 'center', minH: '11', py: '2', cursor: 'pointer' },
});

/** One of several, a line each with its own note. Takes what a form's register gives. */
export function RadioRows({ legend, options, error, ...field }: Props) {
  const errorId = useId();
  return (
    <chakra.fieldset
      minW="0"
      role="radiogroup"
      aria-invalid={error !== undefined}
      aria-describedby={error ? errorId : undefined}
    >
      <chakra.legend fontWeight="600">{legend}</chakra.legend>
      <Stack gap="0">
        {options.map((option) => (
          <Row key={option.value}>
            <chakra.input
              type="radio"
              w="5"
              h="5"
              flex="none"
              accentColor="{colors.brand}"
              value={option.value}
              {...field}
            />
            <span>
              {option.label}{' '}
              {option.note && (
                <Box as="span" color={option.isPast ? 'state.stop' : 'ink.muted'}>
                  {option.isPast && <ShapeMark shape="octagon" inline />}
                  {option.note}
                </Box>
              )}
            </span>
          </Row>
        ))}
      </Stack>
      {error && (
        <Box id={errorId} color="state.stop" fontSize="small">
          {error}
        </Box>
      )}
    </chakra.fieldset>
  );
}
