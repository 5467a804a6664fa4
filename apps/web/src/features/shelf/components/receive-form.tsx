import { Box, Button, Flex, Stack } from '@chakra-ui/react';
import { useFieldArray, useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import type { ShelfPack } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { TextField } from '../../../shared/ui/text-field.js';
import { emptyRow, type ReceiptForm } from '../receipt-form.js';
import { useReceive } from '../use-receive.js';
import { ReceiptRowFields } from './receipt-row-fields.js';

/** Receive by hand: what came without an order. */
export function ReceiveForm({ packs }: { packs: readonly ShelfPack[] }) {
  const { address } = useDarkroom();
  const navigate = useNavigate();
  const first = packs[0]?.id ?? '';
  const form = useForm<ReceiptForm>({
    defaultValues: { rows: [emptyRow(first)], note: '' },
  });
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'rows' });
  const { receive } = useReceive(form, null);
  const { formState } = form;
  const submit = form.handleSubmit(async (filled) => {
    if (await receive(filled)) await navigate(paths.shelf(address));
  });
  if (packs.length === 0) return <Box>This darkroom keeps no packs yet.</Box>;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <Stack gap="5" maxW="60rem">
        {fields.map((row, index) => (
          <Box key={row.id}>
            <ReceiptRowFields form={form} index={index} legend={`Pack ${index + 1}`} packs={packs} />
            {fields.length > 1 && (
              <Button
                variant="plain"
                px="0"
                minH="11"
                textDecoration="underline"
                onClick={() => remove(index)}
              >
                Leave out pack {index + 1}
              </Button>
            )}
          </Box>
        ))}
        <TextField label="Note" error={formState.errors.note?.message} {...form.register('note')} />
        <FormError message={formState.errors.root?.message} />
        <Flex gap="3" wrap="wrap">
          <Button variant="outline" minH="13" onClick={() => append(emptyRow(first))}>
            Another pack
          </Button>
          <Button type="submit" minH="13" loading={formState.isSubmitting} loadingText="Receiving">
            Put on the shelf
          </Button>
        </Flex>
      </Stack>
    </form>
  );
}
