import { Box, Button, Flex } from '@chakra-ui/react';

interface Props {
  onMine: () => void;
  onTheirs: () => void;
}

/** Two people at one draft: nothing of either is lost before somebody has said which stands. */
export function DraftChanged({ onMine, onTheirs }: Props) {
  return (
    <Box role="alert" borderWidth="1px" borderColor="rule" borderRadius="control" p="3" bg="surface">
      <Box fontWeight="600">
        Somebody else has saved this draft meanwhile. What you typed is still here; what is saved now stands
        beside it.
      </Box>
      <Flex gap="3" wrap="wrap" mt="2">
        <Button variant="outline" minH="11" onClick={onMine}>
          Go on with mine
        </Button>
        <Button variant="outline" minH="11" onClick={onTheirs}>
          Take what is saved
        </Button>
      </Flex>
    </Box>
  );
}
