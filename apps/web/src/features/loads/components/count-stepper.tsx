import { Box, Button, Flex, Input } from '@chakra-ui/react';
import { useId, useState } from 'react';
import type { FormatName } from '../../../shared/api/types.js';
import { MOST } from '../most-rolls.js';
import { pieces } from '../../../shared/formats/film-words.js';

interface Props {
  /** 0: what was typed is no count. */
  count: number;
  format: FormatName;
  onChange: (count: number) => void;
}

/** The number that was typed, or 0: it is never taken for another one. */
const countOf = (text: string): number => {
  const count = /^\d{1,2}$/.test(text.trim()) ? Number(text) : 0;
  return count >= 1 && count <= MOST ? count : 0;
};

const within = (count: number): number => Math.min(MOST, Math.max(1, count));

/** Minus, the number (which may be typed), plus: for wet hands. */
export function CountStepper({ count, format, onChange }: Props) {
  const [, unit] = pieces(format, count).split(' ');
  const [typed, setTyped] = useState<string | null>(null);
  const complaint = useId();
  // As typed, until the count is changed by anything else.
  const shown = typed !== null && countOf(typed) === count ? typed : String(count);
  const set = (next: number): void => {
    setTyped(null);
    onChange(next);
  };
  return (
    <Box>
      <Flex align="center" justify="space-between" gap="3">
        <Button
          variant="outline"
          w="16"
          h="16"
          fontSize="figure"
          aria-label="One less"
          disabled={count <= 1}
          onClick={() => set(within(count - 1))}
        >
          −
        </Button>
        <Flex align="baseline" gap="2">
          <Input
            aria-label="How many"
            inputMode="numeric"
            w="20"
            h="14"
            textAlign="right"
            fontSize="title"
            fontWeight="700"
            borderColor="transparent"
            value={shown}
            aria-invalid={count === 0}
            aria-describedby={count === 0 ? complaint : undefined}
            onFocus={(event) => event.target.select()}
            onChange={(event) => {
              setTyped(event.target.value);
              onChange(countOf(event.target.value));
            }}
          />
          <Box as="span" fontSize="lead">
            {unit}
          </Box>
        </Flex>
        <Button
          variant="outline"
          w="16"
          h="16"
          fontSize="figure"
          aria-label="One more"
          disabled={count >= MOST}
          onClick={() => set(within(count + 1))}
        >
          +
        </Button>
      </Flex>
      {count === 0 && (
        <Box id={complaint} role="alert" color="state.stop" fontWeight="600">
          Whole {unit}, 1 to {MOST}.
        </Box>
      )}
    </Box>
  );
}
