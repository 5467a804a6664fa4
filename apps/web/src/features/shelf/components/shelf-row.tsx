import { Box, Button, chakra, Flex } from '@chakra-ui/react';
import { type LocalDate } from '@wetside/chemistry';
import type { ShelfPack } from '../../../shared/api/types.js';
import { useMay } from '../../../shared/darkroom/darkroom-context.js';
import { listOf } from '../../../shared/formats/amounts.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import { supplierFor } from '../../orders/to-order.js';
import { useDraftOrder } from '../../orders/use-draft-order.js';
import { byExpiry, lotToUseFirst } from '../lot-expiry.js';
import { ShelfLot } from './shelf-lot.js';

interface Props {
  pack: ShelfPack;
  today: LocalDate;
}

const words = (pack: ShelfPack): string => {
  const parts = [`${pack.unopened} on the shelf`];
  if (pack.onOrder > 0) parts.push(`${pack.onOrder} on order`);
  if (pack.reorderPoint !== null) parts.push(`reorder at ${pack.reorderPoint}`);
  return parts.join(', ');
};

/** A kind of pack: how many, what is on its way, what the advice is, and its lots. */
export function ShelfRow({ pack, today }: Props) {
  const mayOrder = useMay('technician');
  const draft = useDraftOrder();
  const soldBy = supplierFor(pack, today);
  const makes = [...new Set(pack.makes.map(({ chemistryName }) => chemistryName))];
  const lots = [...pack.lots].sort(byExpiry);
  const first = lotToUseFirst(lots, today);
  return (
    <Box as="li" py="4" borderTopWidth="1px" borderColor="line">
      <Flex gap="3" wrap="wrap" justify="space-between" align="flex-start">
        <Box flex="1 1 15rem" minW="0">
          <chakra.h2 fontSize="lead" fontWeight="700">
            {pack.name}
          </chakra.h2>
          <Box color="ink.muted">
            {pack.form.replaceAll('-', ' ')}
            {makes.length > 0 && `, makes ${listOf(makes)}`}
          </Box>
          <Flex gap="2" align="center">
            {pack.advice.due && <ShapeMark shape="triangle" />}
            <Box fontWeight="600">{words(pack)}</Box>
          </Flex>
          <Box color={pack.advice.due ? 'state.watch' : 'ink.muted'}>{pack.advice.reason}</Box>
        </Box>
        {mayOrder && pack.advice.due && soldBy && (
          <Button
            variant="outline"
            minH="11"
            whiteSpace="normal"
            h="auto"
            py="2"
            loading={draft.isPending}
            loadingText="Drafting"
            aria-label={`Order ${pack.advice.quantity} of ${pack.name}`}
            onClick={() =>
              void draft.begin(soldBy.supplierId, [
                { supplierPackId: soldBy.supplierPackId, count: pack.advice.quantity },
              ])
            }
          >
            Order {pack.advice.quantity}
          </Button>
        )}
      </Flex>
      {draft.problem && <FormError message={draft.problem} />}
      <chakra.ul listStyleType="none" ps="4" mt="2" aria-label={`Lots of ${pack.name}`}>
        {lots.map((lot) => (
          <ShelfLot key={lot.id} lot={lot} today={today} useFirst={lot === first} />
        ))}
      </chakra.ul>
    </Box>
  );
}
