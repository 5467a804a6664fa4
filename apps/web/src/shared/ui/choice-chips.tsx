import { Button, chakra, Flex } from '@chakra-ui/react';
import { useId, useState } from 'react';

interface Props<T extends string> {
  legend: string;
  options: readonly { value: T; label: string }[];
  value: T;
  onChange: (value: T) => void;
  /** So many stand there at first; the rest behind More. The chosen one always stands there. */
  first?: number;
}

const Chip = chakra('label', {
  base: {
    position: 'relative',
    display: 'inline-flex',
    alignItems: 'center',
    minH: '11',
    minW: '11',
    px: '3',
    borderWidth: '1px',
    borderColor: 'field',
    borderRadius: 'control',
    fontWeight: '600',
    cursor: 'pointer',
    '&:has(:checked)': { bg: 'ink', color: 'surface', borderColor: 'ink' },
    '&:has(:focus-visible)': { outline: '3px solid {colors.focus}', outlineOffset: '2px' },
    '& input': { position: 'absolute', inset: 0, opacity: 0, cursor: 'pointer' },
  },
});

/** One of a few, each a touch target; real radio buttons underneath. */
export function ChoiceChips<T extends string>({ legend, options, value, onChange, first }: Props<T>) {
  const [all, setAll] = useState(false);
  const name = useId();
  const shown =
    all || first === undefined ? options : options.filter((o, i) => i < first || o.value === value);
  return (
    <chakra.fieldset minW="0">
      <chakra.legend fontSize="small" color="ink.muted">
        {legend}
      </chakra.legend>
      <Flex wrap="wrap" gap="1.5">
        {shown.map((option) => (
          <Chip key={option.value}>
            <input
              type="radio"
              name={name}
              value={option.value}
              checked={option.value === value}
              onChange={() => onChange(option.value)}
            />
            {option.label}
          </Chip>
        ))}
        {shown.length < options.length && (
          <Button
            variant="outline"
            minH="11"
            px="3"
            onClick={() => setAll(true)}
            aria-label={`More: ${legend}`}
          >
            More
          </Button>
        )}
      </Flex>
    </chakra.fieldset>
  );
}
