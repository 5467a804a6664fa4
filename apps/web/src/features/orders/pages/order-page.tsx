import { Box, Button, Grid, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import type { OrderPageData, OrderState } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { ForRole } from '../../../shared/darkroom/for-role.js';
import { showInstant } from '../../../shared/formats/instants.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading, SectionHeading } from '../../../shared/ui/page-heading.js';
import { useSuppliers } from '../../suppliers/api/get-suppliers.js';
import { OutUntil } from '../../suppliers/components/out-until.js';
import { mailWords } from '../mail-words.js';
import { useOrder } from '../api/get-order.js';
import { CancelSheet } from '../components/cancel-sheet.js';
import { DraftForm } from '../components/draft-form.js';
import { OrderLines } from '../components/order-lines.js';
import { OrderReceive } from '../components/order-receive.js';
import { SendOrder } from '../components/send-order.js';

const stateWords: Record<OrderState, string> = {
  draft: 'A draft. Nothing has been sent.',
  sent: 'On the way.',
  received: 'Nothing more is to come.',
  cancelled: 'Cancelled.',
};

function OutUntilRows({ order }: Pick<OrderPageData, 'order'>) {
  const suppliers = useSuppliers();
  const supplier = suppliers.data?.suppliers.find(({ id }) => id === order.supplier.id);
  const packs = supplier?.packs.filter((pack) =>
    order.lines.some((line) => line.supplierPackId === pack.supplierPackId),
  );
  if (!packs || packs.length === 0) return null;
  return (
    <section aria-labelledby="out">
      <SectionHeading id="out">When the supplier has none</SectionHeading>
      <Stack gap="3">
        {packs.map((pack) => (
          <OutUntil
            key={pack.supplierPackId}
            supplierPackId={pack.supplierPackId}
            packName={pack.packName}
            outUntil={pack.outUntil}
          />
        ))}
      </Stack>
    </section>
  );
}

function Order({ data }: { data: OrderPageData }) {
  const { zone } = useDarkroom();
  const mayCancel = useMay('manager');
  const [cancelling, setCancelling] = useState(false);
  const [unsaved, setUnsaved] = useState(false);
  const { order, mailText } = data;
  const isOpen = order.state === 'draft' || order.state === 'sent';
  return (
    <>
      <PageHeading title={`Order ${order.numberText}, ${order.supplier.name}`} says={stateWords[order.state]}>
        {mayCancel && isOpen && (
          <Button variant="outline" minH="11" onClick={() => setCancelling(true)}>
            {order.state === 'draft' ? 'Cancel the draft' : 'Cancel the rest'}
          </Button>
        )}
      </PageHeading>
      {order.sentAt && (
        <Box>
          Sent {showInstant(order.sentAt, zone, today(zone))} by {order.sentBy}.
          {order.mail && ` ${mailWords(order.mail)}`}
        </Box>
      )}
      <Grid
        templateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) minmax(0, 1fr)' }}
        gapX="8"
        gapY="4"
      >
        <Box>
          {order.state === 'draft' ? (
            <DraftForm key={order.id} order={order} onDirty={setUnsaved} />
          ) : (
            <OrderLines order={order} />
          )}
          {order.state !== 'draft' && order.note && <Box mt="3">Note: {order.note}</Box>}
        </Box>
        <Box>
          {order.state === 'draft' && <SendOrder order={order} mailText={mailText} unsaved={unsaved} />}
          {order.state === 'sent' && <OrderReceive key={order.id} order={order} />}
          {isOpen && <OutUntilRows order={order} />}
        </Box>
      </Grid>
      <CancelSheet order={order} open={cancelling} onClose={() => setCancelling(false)} />
    </>
  );
}

function FetchedOrder() {
  const { id = '' } = useParams();
  const { zone } = useDarkroom();
  const query = useOrder(id);
  return (
    <Fetched query={query} what="the order" missing="order" zone={zone}>
      {(data) => <Order data={data} />}
    </Fetched>
  );
}

export function OrderPage() {
  return (
    <ForRole least="technician" what="Ordering">
      <FetchedOrder />
    </ForRole>
  );
}
