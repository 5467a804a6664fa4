import { Box, chakra, Stack } from '@chakra-ui/react';
import { showDate } from '@wetside/chemistry';
import type { Supplier } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { showMoney } from '../../../shared/formats/amounts.js';
import { OutUntil } from './out-until.js';

function SupplierRow({ supplier }: { supplier: Supplier }) {
  const { zone } = useDarkroom();
  const mayNote = useMay('technician');
  const { currency } = supplier;
  const terms = [
    supplier.email,
    supplier.minimumMinor === null ? 'no minimum' : `minimum ${showMoney(supplier.minimumMinor, currency)}`,
    supplier.leadDays === null ? 'lead time not known' : `about ${supplier.leadDays} days`,
  ];
  return (
    <Box as="li" py="4" borderTopWidth="1px" borderColor="line">
      <chakra.h2 fontSize="lead" fontWeight="700">
        {supplier.name}
      </chakra.h2>
      <Box color="ink.muted">{terms.join(', ')}</Box>
      <Stack gap="3" mt="3">
        {supplier.packs.map((pack) => (
          <Box key={pack.supplierPackId}>
            <Box>
              {pack.supplierName}, {showMoney(pack.priceMinor, currency)}
              {pack.outUntil && `, out until ${showDate(pack.outUntil, today(zone))}`}
            </Box>
            {mayNote && (
              <OutUntil
                supplierPackId={pack.supplierPackId}
                packName={pack.packName}
                outUntil={pack.outUntil}
              />
            )}
          </Box>
        ))}
      </Stack>
    </Box>
  );
}

export function SupplierList({ suppliers }: { suppliers: readonly Supplier[] }) {
  if (suppliers.length === 0) return <Box>This darkroom has no suppliers yet.</Box>;
  return (
    <chakra.ul listStyleType="none" aria-label="Suppliers">
      {suppliers.map((supplier) => (
        <SupplierRow key={supplier.id} supplier={supplier} />
      ))}
    </chakra.ul>
  );
}
