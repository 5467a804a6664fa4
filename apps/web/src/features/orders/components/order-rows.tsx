import { Box, chakra, Flex } from '@chakra-ui/react';
import type { OrderView } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { countOf, showMoney } from '../../../shared/formats/amounts.js';
import { showInstant } from '../../../shared/formats/instants.js';
import { paths } from '../../../shared/routes/paths.js';
import { TextLink } from '../../../shared/ui/links.js';

interface Props {
  label: string;
  orders: readonly OrderView[];
  empty: string;
}

const openCount = (order: OrderView): number =>
  order.lines.reduce((sum, line) => sum + line.count - line.received - line.cancelled, 0);

function stateWords(order: OrderView, zone: string, date: string): string {
  if (order.state === 'draft')
    return `drafted ${showInstant(order.draftedAt, zone, date)} by ${order.draftedBy}`;
  if (order.state === 'sent' && order.sentAt) {
    return `sent ${showInstant(order.sentAt, zone, date)}, ${countOf(openCount(order), 'pack')} to come`;
  }
  return order.state;
}

export function OrderRows({ label, orders, empty }: Props) {
  const { address, zone } = useDarkroom();
  if (orders.length === 0) return <Box>{empty}</Box>;
  return (
    <chakra.ul listStyleType="none" aria-label={label}>
      {orders.map((order) => (
        <Flex as="li" key={order.id} gap="3" wrap="wrap" py="3" borderTopWidth="1px" borderColor="line">
          <TextLink
            to={paths.order(address, order.id)}
            minH="11"
            display="inline-flex"
            alignItems="center"
            fontWeight="600"
          >
            Order {order.numberText}, {order.supplier.name}
          </TextLink>
          <Box flex="1 1 12rem" color="ink.muted" alignSelf="center">
            {stateWords(order, zone, today(zone))}
          </Box>
          <Box alignSelf="center">{showMoney(order.totalMinor, order.currency)}</Box>
        </Flex>
      ))}
    </chakra.ul>
  );
}
