import { Box, Button, Stack } from '@chakra-ui/react';
import { type ChemistryDocument, type WasteRoute, wasteRoutes } from '@wetside/chemistry';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../../../shared/actions/send-action.js';
import type { BottleView } from '../../../shared/api/types.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { showProblem } from '../../../shared/ui/form-problem.js';
import { Sheet } from '../../../shared/ui/sheet.js';
import { SelectField, TextField } from '../../../shared/ui/text-field.js';
import { usePutDiscard } from '../api/put-discard.js';

interface Props {
  bottle: BottleView;
  document: ChemistryDocument;
  open: boolean;
  onClose: () => void;
}

const routeWords: Record<WasteRoute, string> = {
  'fixer-silver': 'Fixer (silver)',
  'bleach-fix-silver-iron': 'Bleach-fix (silver and iron)',
  developer: 'Developer',
  'stop-and-acids': 'Stop and acids',
  'carrier-only': 'Alone, for the carrier only',
  other: 'Other',
  unknown: 'Unknown',
};
const options = wasteRoutes.map((value) => ({ value, label: routeWords[value] }));

function DiscardForm({ bottle, document, onClose }: Props) {
  const [actionId] = useState(newId);
  const discard = usePutDiscard();
  const { register, handleSubmit, setError, formState } = useForm({
    defaultValues: { wasteRoute: document.waste.route, note: '' },
  });
  const { errors, isSubmitting } = formState;
  const confirm = handleSubmit(async ({ wasteRoute, note }) => {
    const content = { bottleId: bottle.id, wasteRoute, ...(note.trim() && { note: note.trim() }) };
    try {
      await discard.sendFromSheet(actionId, content, { words: `${bottle.code} is discarded.` });
      onClose();
    } catch (error) {
      showProblem(error, setError, (field) => (field === 'note' || field === 'wasteRoute' ? field : null));
    }
  });
  return (
    <form onSubmit={(event) => void confirm(event)} noValidate>
      <Stack gap="4">
        <SelectField
          label="Waste apart"
          options={options}
          help={document.waste.note}
          error={errors.wasteRoute?.message}
          {...register('wasteRoute')}
        />
        <Box as="ul" ps="5" listStyleType="disc" aria-label="Mind">
          {[...document.cautions, document.hazardNote].map((words) => (
            <li key={words}>{words}</li>
          ))}
        </Box>
        <TextField label="Note" error={errors.note?.message} {...register('note')} />
        <FormError message={errors.root?.message} />
        <Button type="submit" minH="13" whiteSpace="normal" loading={isSubmitting} loadingText="Recording">
          Discard {bottle.code}
        </Button>
      </Stack>
    </form>
  );
}

export function DiscardSheet(props: Props) {
  return (
    <Sheet open={props.open} onClose={props.onClose} title={`Discard ${props.bottle.code}`}>
      <DiscardForm {...props} />
    </Sheet>
  );
}
