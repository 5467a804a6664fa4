import { Box } from '@chakra-ui/react';

/** Rows at their true size, so that nothing jumps when the bottles arrive. */
export function SinkOutline() {
  return (
    <Box aria-hidden="true">
      {[1, 2, 3].map((row) => (
        <Box key={row} h="19" borderBottomWidth="1px" borderColor="line" />
      ))}
    </Box>
  );
}
