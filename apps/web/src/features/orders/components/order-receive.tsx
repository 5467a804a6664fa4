import { Box, Button, Stack } from '@chakra-ui/react';
import { useEffect, useRef } from 'react';
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
  const form = useForm<ReceiptForm>({ defaultValues: { rows: rowsOf(order), note: '' } });
  const { receive, over } = useReceive(form, order.id);
  const { formState, register } = form;
  const { isDirty } = formState;
  const progress = order.lines.reduce((sum, line) => sum + line.received, 0);
  const rows = form.getValues('rows');
  const shown = useRef(progress);
  useEffect(() => {
    // Others receive too, and undo: the rows follow the order as long as nothing is typed into them.
    if (isDirty || shown.current === progress) return;
    shown.current = progress;
    form.reset({ rows: rowsOf(order), note: '' });
  }, [progress, isDirty, form, order]);
  const submit = form.handleSubmit(async (filled) => {
    const answer = await receive(filled);
    if (answer?.order) form.reset({ rows: rowsOf(answer.order), note: '' });
  });
  return (
    <section aria-labelledby="receive">
      <SectionHeading id="receive">Receive</SectionHeading>
      <form onSubmit={(event) => void submit(event)} noValidate>
        <Stack gap="4">
          {rows.map((row, index) => (
            <ReceiptRowFields
              key={row.lotId}
              form={form}
              index={index}
              legend={row.packName}
              isOver={over.includes(index)}
            />
          ))}
          <TextField label="Note" error={formState.errors.note?.message} {...register('note')} />
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
