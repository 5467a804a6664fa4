import { Box, Button, Flex, Input } from '@chakra-ui/react';
import type { FormatName } from '../../../shared/api/types.js';
import { pieces } from '../../../shared/formats/film-words.js';

export const MOST = 99;

interface Props {
  count: number;
  format: FormatName;
  onChange: (count: number) => void;
}

const within = (count: number): number => Math.min(MOST, Math.max(1, count));

/** Minus, the number (which may be typed), plus: for wet hands. */
export function CountStepper({ count, format, onChange }: Props) {
  const [, unit] = pieces(format, count).split(' ');
  return (
    <Flex align="center" justify="space-between" gap="3">
      <Button
        variant="outline"
        w="16"
        h="16"
        fontSize="figure"
        aria-label="One less"
        disabled={count <= 1}
        onClick={() => onChange(within(count - 1))}
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
          value={String(count)}
          onFocus={(event) => event.target.select()}
          onChange={(event) => {
            const typed = Number(event.target.value.replace(/\D/g, '').slice(-2));
            if (typed > 0) onChange(within(typed));
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
        onClick={() => onChange(within(count + 1))}
      >
        +
      </Button>
    </Flex>
  );
}
