import { Box, Button, Stack } from '@chakra-ui/react';
import { type ChemistryDocument, type WasteRoute, wasteRoutes } from '@wetside/chemistry';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../../../shared/actions/send-action.js';
import type { BottleView } from '../../../shared/api/types.js';
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
  const { register, handleSubmit } = useForm({
    defaultValues: { wasteRoute: document.waste.route, note: '' },
  });
  const confirm = handleSubmit(({ wasteRoute, note }) => {
    const content = { bottleId: bottle.id, wasteRoute, ...(note.trim() && { note: note.trim() }) };
    discard.send(actionId, content, { words: `${bottle.code} is discarded.` });
    onClose();
  });
  return (
    <form onSubmit={(event) => void confirm(event)} noValidate>
      <Stack gap="4">
        <SelectField
          label="Waste apart"
          options={options}
          help={document.waste.note}
          {...register('wasteRoute')}
        />
        <Box as="ul" ps="5" listStyleType="disc" aria-label="Mind">
          {[...document.cautions, document.hazardNote].map((words) => (
            <li key={words}>{words}</li>
          ))}
        </Box>
        <TextField label="Note" {...register('note')} />
        <Button type="submit" minH="13" whiteSpace="normal">
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
