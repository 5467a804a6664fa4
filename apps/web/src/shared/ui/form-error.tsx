import { Box } from '@chakra-ui/react';

/** What is wrong with the whole of a form. */
export function FormError({ message }: { message: string | undefined }) {
  return (
    <Box role="alert" color="state.stop">
      {message}
    </Box>
  );
}
