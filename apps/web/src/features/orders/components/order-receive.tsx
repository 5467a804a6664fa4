import { Box, Button, chakra, Stack } from '@chakra-ui/react';
import { useForm } from 'react-hook-form';
import type { OrderView } from '../../../shared/api/types.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { SectionHeading } from '../../../shared/ui/page-heading.js';
import { TextField } from '../../../shared/ui/text-field.js';
import { ReceiptRowFields } from '../../shelf/components/receipt-row-fields.js';
import { emptyRow, type ReceiptForm, type ReceiptRow } from '../../shelf/receipt-form.js';
import { useReceive } from '../../shelf/use-receive.js';

/** A row for each line that has packs to come, filled in as if all of them had. */
const rowsOf = (order: OrderView): ReceiptRow[] =>
  order.lines.flatMap((line) => {
    const open = line.count - line.received - line.cancelled;
    if (open <= 0) return [];
    return [{ ...emptyRow(line.packId, line.packName), orderLineId: line.id, count: String(open) }];
  });

/** Receive a delivery, in part or whole. */
export function OrderReceive({ order }: { order: OrderView }) {
  const form = useForm<ReceiptForm>({
    defaultValues: { rows: rowsOf(order), note: '', overDeliveryOk: false },
  });
  const { receive, moreThanOrdered } = useReceive(form, order.id);
  const { formState, register } = form;
  const rows = form.getValues('rows');
  const submit = form.handleSubmit(async (filled) => {
    await receive(filled);
  });
  return (
    <section aria-labelledby="receive">
      <SectionHeading id="receive">Receive</SectionHeading>
      <form onSubmit={(event) => void submit(event)} noValidate>
        <Stack gap="4">
          {rows.map((row, index) => (
            <ReceiptRowFields key={row.lotId} form={form} index={index} legend={row.packName} />
          ))}
          <TextField label="Note" {...register('note')} />
          {moreThanOrdered && (
            <chakra.label display="flex" gap="3" alignItems="center" minH="11">
              <chakra.input type="checkbox" w="5" h="5" flex="none" {...register('overDeliveryOk')} />
              More came than was ordered, and it is kept.
            </chakra.label>
          )}
          <FormError message={formState.errors.root?.message} />
          <Box>
            <Button type="submit" minH="13" loading={formState.isSubmitting} loadingText="Receiving">
              Receive these packs
            </Button>
          </Box>
        </Stack>
      </form>
    </section>
  );
}
