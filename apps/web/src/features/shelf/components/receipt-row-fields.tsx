import { Box, chakra, Grid } from '@chakra-ui/react';
import type { UseFormReturn } from 'react-hook-form';
import type { ShelfPack } from '../../../shared/api/types.js';
import { SelectField, TextField } from '../../../shared/ui/text-field.js';
import { hasCome, type ReceiptForm } from '../receipt-form.js';

interface Props {
  form: UseFormReturn<ReceiptForm>;
  index: number;
  legend: string;
  /** Given where the pack is chosen here; without it the row belongs to a line of an order. */
  packs?: readonly ShelfPack[];
}

const whole = /^\d{1,3}$/;

/** What came of one pack: how many, which lot, until when. */
export function ReceiptRowFields({ form, index, legend, packs }: Props) {
  const { register, formState, getValues } = form;
  const errors = formState.errors.rows?.[index];
  const least = packs ? 1 : 0;
  return (
    <Box borderTopWidth="1px" borderColor="line" pt="3">
      <chakra.fieldset minW="0">
        <chakra.legend fontWeight="700">{legend}</chakra.legend>
        <Grid
          templateColumns={{ base: '1fr', sm: '1fr 1fr', xl: packs ? '2fr 1fr 1fr 1fr' : '1fr 1fr 1fr' }}
          gap="3"
        >
          {packs && (
            <SelectField
              label="Pack"
              options={packs.map(({ id, name }) => ({ value: id, label: name }))}
              error={errors?.packId?.message}
              {...register(`rows.${index}.packId`)}
            />
          )}
          <TextField
            label="How many came"
            inputMode="numeric"
            error={errors?.count?.message}
            {...register(`rows.${index}.count`, {
              validate: (text) =>
                (whole.test(text.trim()) && Number(text) >= least) || `Whole packs, ${least} to 999.`,
            })}
          />
          <TextField
            label="Lot number"
            error={errors?.lotNumber?.message}
            {...register(`rows.${index}.lotNumber`, {
              validate: (text) => {
                const row = getValues(`rows.${index}`);
                return !hasCome(row) || text.trim() !== '' || 'Copy the lot number from the pack.';
              },
            })}
          />
          <TextField
            label="Expires"
            type="date"
            help="Left open, it is guessed."
            error={errors?.expiresOn?.message}
            {...register(`rows.${index}.expiresOn`)}
          />
        </Grid>
      </chakra.fieldset>
    </Box>
  );
}
