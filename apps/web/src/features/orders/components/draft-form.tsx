import { Box, Button, Flex, Grid, Stack } from '@chakra-ui/react';
import { useEffect, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import type { OrderView } from '../../../shared/api/types.js';
import { showMoney } from '../../../shared/formats/amounts.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { showProblem } from '../../../shared/ui/form-problem.js';
import { TextField } from '../../../shared/ui/text-field.js';
import { usePatchOrder } from '../api/patch-order.js';
import { type DraftValues, editedLines, isCount, savedCount, totalWords, valuesOf } from '../draft-values.js';
import { DraftChanged } from './draft-changed.js';

interface Props {
  order: OrderView;
  /** Told whether something is typed that is not saved. */
  onDirty: (dirty: boolean) => void;
}

/** The counts and the note of a draft. It begins anew from what is saved, and from nothing else. */
export function DraftForm(props: Props) {
  const [start, setStart] = useState({ order: props.order, round: 0 });
  const begin = (order: OrderView): void => setStart(({ round }) => ({ order, round: round + 1 }));
  return <DraftFields key={start.round} from={start.order} onTake={begin} {...props} />;
}

interface FieldsProps extends Props {
  from: OrderView;
  onTake: (saved: OrderView) => void;
}

/** A count of 0 takes the line out. What others save meanwhile is shown beside. */
function DraftFields({ from, onTake, order, onDirty }: FieldsProps) {
  const patch = usePatchOrder(order.id);
  /** The order that the edits were begun on. */
  const [base, setBase] = useState(from);
  const form = useForm<DraftValues>({
    values: valuesOf(base),
    // Where others have saved meanwhile, what was typed here stays; all else is as it was saved.
    resetOptions: { keepDirtyValues: true },
  });
  const { register, handleSubmit, setError, formState } = form;
  const { isDirty, dirtyFields, isSubmitting, errors } = formState;
  const counts = useWatch({ control: form.control, name: 'counts' });
  const changed = order.revision !== base.revision;
  // Nothing typed, nothing to lose: the form follows the order.
  if (changed && !isDirty && !isSubmitting) setBase(order);
  const asks = changed && isDirty && !isSubmitting;
  /** What was typed stays, also on a line that somebody took out. */
  const keepMine = (): void => {
    const isMine = ({ id }: { id: string }): boolean => dirtyFields.counts?.[id] === true;
    const added = editedLines(order, base).filter((line) => !order.lines.includes(line) && isMine(line));
    setBase({ ...order, lines: [...order.lines, ...added] });
  };
  useEffect(() => {
    onDirty(isDirty);
    return () => onDirty(false);
  }, [isDirty, onDirty]);
  const lines = editedLines(order, base);
  const save = handleSubmit(async (typed) => {
    const wanted = lines.map(({ id, supplierPackId, count }) => ({
      id,
      supplierPackId,
      count: Number(typed.counts[id] ?? count),
    }));
    try {
      const saved = await patch.mutateAsync({
        revision: base.revision,
        note: typed.note.trim() || null,
        lines: wanted,
      });
      onTake(saved.order);
    } catch (error) {
      showProblem(error, setError, (field) => {
        const [, at] = /^lines\.(\d+)\.count$/.exec(field) ?? [];
        const line = at === undefined ? undefined : wanted[Number(at)];
        return line ? `counts.${line.id}` : field === 'note' ? 'note' : null;
      });
    }
  });
  return (
    <form onSubmit={(event) => void save(event)} noValidate>
      <Stack gap="3">
        {lines.map((line) => (
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
              error={errors.counts?.[line.id]?.message}
              help={savedCount(line.id, order, base)}
              {...register(`counts.${line.id}`, {
                value: String(line.count),
                validate: (text) => isCount(text) || 'Whole packs, 0 to 999.',
              })}
            />
          </Grid>
        ))}
        <TextField
          label="Note to the supplier"
          error={errors.note?.message}
          help={order.note === base.note ? undefined : `Saved now: ${order.note ?? 'no note'}`}
          {...register('note')}
        />
        <FormError message={asks ? undefined : errors.root?.message} />
        {asks && <DraftChanged onMine={keepMine} onTheirs={() => onTake(order)} />}
        <Flex gap="3" wrap="wrap" justify="space-between" align="center">
          <Box fontWeight="700">{totalWords(lines, counts, order.currency)}</Box>
          <Button
            type="submit"
            variant="outline"
            minH="11"
            disabled={asks}
            loading={isSubmitting}
            loadingText="Saving"
          >
            Save draft
          </Button>
        </Flex>
      </Stack>
    </form>
  );
}
