import { Box, Button, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { newId } from '../../../shared/actions/send-action.js';
import { TextField } from '../../../shared/ui/text-field.js';
import { usePutSettingChange } from '../api/put-setting-change.js';

interface Props {
  supplierPackId: string;
  packName: string;
  outUntil: string | null;
}

/** "Out until": when the supplier will have it again. */
export function OutUntil({ supplierPackId, packName, outUntil }: Props) {
  const change = usePutSettingChange();
  const [actionId, setActionId] = useState(newId);
  const { register, handleSubmit } = useForm({ values: { outUntil: outUntil ?? '' } });
  const save = handleSubmit(({ outUntil: value }) => {
    const changes = [{ field: 'outUntil' as const, value: value === '' ? null : value }];
    const words = value === '' ? `${packName} can be had again.` : `${packName} is noted as out.`;
    change.send(actionId, { subject: 'supplier-pack', subjectId: supplierPackId, changes }, { words });
    setActionId(newId());
  });
  return (
    <form onSubmit={(event) => void save(event)}>
      <Flex gap="2" align="flex-end" wrap="wrap">
        <Box flex="0 1 15rem">
          <TextField label={`${packName}: out until`} type="date" {...register('outUntil')} />
        </Box>
        <Button type="submit" variant="outline" minH="11" aria-label={`Note it for ${packName}`}>
          Note it
        </Button>
      </Flex>
    </form>
  );
}
