import { Box, chakra, Flex } from '@chakra-ui/react';
import type { OrderView } from '../../../shared/api/types.js';
import { showMoney } from '../../../shared/formats/amounts.js';

/** The lines of an order that is not being edited. */
export function OrderLines({ order }: { order: OrderView }) {
  return (
    <chakra.ul listStyleType="none" aria-label="Ordered">
      {order.lines.map((line) => {
        const notes = [`${line.received} of ${line.count} received`];
        if (line.cancelled > 0) notes.push(`${line.cancelled} cancelled`);
        return (
          <Flex as="li" key={line.id} gap="3" wrap="wrap" py="2" borderTopWidth="1px" borderColor="line">
            <Box flex="1 1 12rem" minW="0" fontWeight="600">
              {line.packName}
            </Box>
            <Box>{notes.join(', ')}</Box>
            <Box>{showMoney(line.priceMinor, order.currency)} each</Box>
          </Flex>
        );
      })}
    </chakra.ul>
  );
}
