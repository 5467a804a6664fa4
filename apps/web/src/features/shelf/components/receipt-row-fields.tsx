import { Box, chakra, Grid } from '@chakra-ui/react';
import type { LocalDate } from '@wetside/chemistry';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import type { ShelfPack } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ShapeMark } from '../../../shared/ui/state-mark.js';
import { SelectField, TextField } from '../../../shared/ui/text-field.js';
import { hasCome, type ReceiptForm } from '../receipt-form.js';

interface Props {
  form: UseFormReturn<ReceiptForm>;
  index: number;
  legend: string;
  /** Given where the pack is chosen here; without it the row belongs to a line of an order. */
  packs?: readonly ShelfPack[];
  /** More came than was ordered: asked here, at its count. */
  isOver?: boolean;
}

/** The most that the server takes of a lot number, in characters. */
const MOST_LOT = 60;
const whole = /^\d{1,3}$/;
const isPast = (expiresOn: string, now: LocalDate): boolean => expiresOn !== '' && expiresOn < now;

function PastDate() {
  return (
    <Box as="span" role="status" color="state.watch" fontWeight="600">
      <ShapeMark shape="triangle" inline />
      That date is past.
    </Box>
  );
}

/** What came of one pack: how many, which lot, until when. */
export function ReceiptRowFields({ form, index, legend, packs, isOver = false }: Props) {
  const { register, formState, getValues } = form;
  const { zone } = useDarkroom();
  const expiresOn = useWatch({ control: form.control, name: `rows.${index}.expiresOn` });
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
                const { length } = text.trim();
                if (length > MOST_LOT) return `${MOST_LOT} characters at the most; this is ${length}.`;
                return (
                  !hasCome(getValues(`rows.${index}`)) || length > 0 || 'Copy the lot number from the pack.'
                );
              },
            })}
          />
          <TextField
            label="Expires"
            type="date"
            // A warning only: what came expired stands on the shelf all the same.
            help={isPast(expiresOn, today(zone)) ? <PastDate /> : 'Left open, it is guessed.'}
            error={errors?.expiresOn?.message}
            {...register(`rows.${index}.expiresOn`)}
          />
        </Grid>
        {isOver && (
          <chakra.label display="flex" gap="3" alignItems="center" minH="11">
            <chakra.input
              type="checkbox"
              w="5"
              h="5"
              flex="none"
              accentColor="{colors.brand}"
              {...register(`rows.${index}.moreIsRight`)}
            />
            More came than was ordered, and it is kept.
          </chakra.label>
        )}
      </chakra.fieldset>
    </Box>
  );
}
