import { Box, Button, chakra, Flex, Stack } from '@chakra-ui/react';
import { showDate } from '@wetside/chemistry';
import { useState } from 'react';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { countOf, showMoney } from '../../../shared/formats/amounts.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { useShelf } from '../../shelf/api/get-shelf.js';
import { type Due, dueBySupplier } from '../to-order.js';
import { useDraftOrder } from '../use-draft-order.js';

const Check = chakra('label', {
  base: { display: 'flex', gap: '3', alignItems: 'center', minH: '11', cursor: 'pointer' },
});

function SupplierGroup({ due, today }: { due: readonly Due[]; today: string }) {
  const draft = useDraftOrder();
  const [out, setOut] = useState<ReadonlySet<string>>(new Set());
  const [first] = due;
  if (!first) return null;
  const { supplierName, supplierId, currency } = first.soldBy;
  const chosen = due.filter(({ pack }) => !out.has(pack.id));
  const priced = chosen.every(({ soldBy }) => soldBy.priceMinor !== null);
  const total = chosen.reduce((sum, { soldBy, count }) => sum + (soldBy.priceMinor ?? 0) * count, 0);
  const toggle = (id: string): void =>
    setOut((now) => (now.has(id) ? new Set([...now].filter((one) => one !== id)) : new Set([...now, id])));
  return (
    <Box as="li" py="4" borderTopWidth="1px" borderColor="line">
      <Flex justify="space-between" wrap="wrap" gap="3">
        <chakra.h2 fontSize="lead" fontWeight="700">
          {supplierName}
        </chakra.h2>
        <Box>{showMoney(priced ? total : null, currency)}</Box>
      </Flex>
      <Stack gap="1" my="2">
        {due.map(({ pack, soldBy, count }) => (
          <Check key={pack.id}>
            <chakra.input
              type="checkbox"
              w="5"
              h="5"
              flex="none"
              accentColor="{colors.brand}"
              checked={!out.has(pack.id)}
              onChange={() => toggle(pack.id)}
            />
            <span>
              {pack.name} × {count}{' '}
              <Box as="span" color="ink.muted">
                {pack.advice.reason}
                {soldBy.outUntil &&
                  soldBy.outUntil > today &&
                  `, out until ${showDate(soldBy.outUntil, today)}`}
              </Box>
            </span>
          </Check>
        ))}
      </Stack>
      <FormError message={draft.problem ?? undefined} />
      <Button
        variant="outline"
        minH="11"
        whiteSpace="normal"
        h="auto"
        py="2"
        disabled={chosen.length === 0}
        loading={draft.isPending}
        loadingText="Drafting"
        onClick={() =>
          void draft.begin(
            supplierId,
            chosen.map(({ soldBy, count }) => ({ supplierPackId: soldBy.supplierPackId, count })),
          )
        }
      >
        Draft an order of {countOf(chosen.length, 'line')} at {supplierName}
      </Button>
    </Box>
  );
}

/** What the shelf is short of, by supplier. */
export function ToOrderList() {
  const { zone } = useDarkroom();
  const query = useShelf();
  return (
    <Fetched query={query} what="the shelf" zone={zone}>
      {({ packs, today }) => {
        const groups = [...dueBySupplier(packs, today)];
        const nowhere = packs.filter((pack) => pack.advice.due && pack.soldBy.length === 0);
        return (
          <>
            {groups.length + nowhere.length === 0 && <Box>Nothing has to be ordered.</Box>}
            <chakra.ul listStyleType="none" aria-label="To order">
              {groups.map(([supplierId, due]) => (
                <SupplierGroup key={supplierId} due={due} today={today} />
              ))}
            </chakra.ul>
            {nowhere.map((pack) => (
              <Box key={pack.id} py="2">
                {pack.name} × {pack.advice.quantity}: no supplier is known for it.
              </Box>
            ))}
          </>
        );
      }}
    </Fetched>
  );
}
