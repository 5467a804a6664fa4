import { Box, Button, Flex, Grid, Stack } from '@chakra-ui/react';
import { useEffect } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import type { OrderView } from '../../../shared/api/types.js';
import { showMoney } from '../../../shared/formats/amounts.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { showProblem } from '../../../shared/ui/form-problem.js';
import { TextField } from '../../../shared/ui/text-field.js';
import { usePatchOrder } from '../api/patch-order.js';

interface DraftValues {
  counts: { count: string }[];
  note: string;
}

const whole = /^\d{1,3}$/;
const valuesOf = (order: OrderView): DraftValues => ({
  counts: order.lines.map(({ count }) => ({ count: String(count) })),
  note: order.note ?? '',
});

interface Props {
  order: OrderView;
  /** Told whether something is typed that is not saved. */
  onDirty: (dirty: boolean) => void;
}

/** What the counts as they are typed come to, or what to mend first. */
function totalWords(order: OrderView, counts: DraftValues['counts']): string {
  if (!counts.every(({ count }) => whole.test(count.trim())))
    return 'The total follows whole packs, 0 to 999.';
  const total = order.lines.reduce<number | null>((sum, line, index) => {
    const count = Number(counts[index]?.count ?? line.count);
    if (sum === null || count === 0) return sum;
    return line.priceMinor === null ? null : sum + line.priceMinor * count;
  }, 0);
  return `Total ${showMoney(total, order.currency)}`;
}

/** The counts and the note of a draft. A count of 0 takes the line out. */
export function DraftForm({ order, onDirty }: Props) {
  const patch = usePatchOrder(order.id);
  const form = useForm<DraftValues>({ defaultValues: valuesOf(order) });
  const { register, handleSubmit, setError, formState } = form;
  const { isDirty } = formState;
  const counts = useWatch({ control: form.control, name: 'counts' });
  useEffect(() => {
    onDirty(isDirty);
    return () => onDirty(false);
  }, [isDirty, onDirty]);
  const save = handleSubmit(async ({ counts, note }) => {
    const lines = order.lines.map(({ id, supplierPackId, count }, index) => ({
      id,
      supplierPackId,
      count: Number(counts[index]?.count ?? count),
    }));
    try {
      await patch.mutateAsync({ revision: order.revision, note: note.trim() || null, lines });
    } catch (error) {
      showProblem(error, setError, (field) => {
        const [, at] = /^lines\.(\d+)\.count$/.exec(field) ?? [];
        return at === undefined ? null : `counts.${Number(at)}.count`;
      });
    }
  });
  return (
    <form onSubmit={(event) => void save(event)} noValidate>
      <Stack gap="3">
        {order.lines.map((line, index) => (
          <Grid key={line.id} templateColumns="minmax(0, 1fr) 6rem" gap="3" alignItems="end">
            <Box pb="2">
              <Box fontWeight="600">{line.packName}</Box>
              <Box color="ink.muted">
                {line.supplierName}, {showMoney(line.priceMinor, order.currency)} each
              </Box>
            </Box>
            <TextField
              label="Count"
              aria-label={`Count of ${line.packName}`}
              inputMode="numeric"
              error={formState.errors.counts?.[index]?.count?.message}
              {...register(`counts.${index}.count`, {
                validate: (text) => whole.test(text.trim()) || 'Whole packs, 0 to 999.',
              })}
            />
          </Grid>
        ))}
        <TextField label="Note to the supplier" {...register('note')} />
        <FormError message={formState.errors.root?.message} />
        <Flex gap="3" wrap="wrap" justify="space-between" align="center">
          <Box fontWeight="700">{totalWords(order, counts)}</Box>
          <Button
            type="submit"
            variant="outline"
            minH="11"
            loading={formState.isSubmitting}
            loadingText="Saving"
          >
            Save draft
          </Button>
        </Flex>
      </Stack>
    </form>
  );
}
