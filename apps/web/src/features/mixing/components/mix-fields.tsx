import { Button, Flex, Grid, Stack } from '@chakra-ui/react';
import { type LocalDate, showVolume } from '@wetside/chemistry';
import type { UseFormReturn } from 'react-hook-form';
import type { ChemistryView } from '../../../shared/api/types.js';
import { RadioRows } from '../../../shared/ui/radio-rows.js';
import { SelectField, TextField } from '../../../shared/ui/text-field.js';
import { checkSize, checkVolume, materialOf, type MixForm } from '../mix-form.js';
import type { MixSource } from '../mix-sources.js';

interface Props {
  form: UseFormReturn<MixForm>;
  values: MixForm;
  chemistries: readonly ChemistryView[];
  chemistry: ChemistryView;
  sources: readonly MixSource[];
  source: MixSource;
  now: LocalDate;
  onChemistry: (id: string) => void;
}

const kinds = [
  { value: 'bottle', label: 'Bottle' },
  { value: 'floating-lid', label: 'Bottle with a floating lid' },
  { value: 'tank', label: 'Tank' },
  { value: 'tray', label: 'Open tray' },
];
const materialLabels = { film: 'Film', 'rc-paper': 'RC paper', 'fb-paper': 'FB paper' } as const;

function VolumeChips({ source, onPick }: { source: MixSource; onPick: (ul: number) => void }) {
  if (!source.maxUl) return null;
  const whole = { words: 'Whole pack', ul: source.maxUl };
  const half = { words: 'Half', ul: Math.floor(source.maxUl / 2_000) * 1_000 };
  const litre = { words: '1 L', ul: 1_000_000 };
  const chips = source.wholeUl ? [whole] : [litre, whole, half].filter(({ ul }) => ul <= whole.ul && ul > 0);
  return (
    <Flex gap="2" wrap="wrap">
      {chips.map(({ words, ul }) => (
        <Button key={words} variant="outline" minH="11" onClick={() => onPick(ul)}>
          {words}
        </Button>
      ))}
    </Flex>
  );
}

/** What, from where, how much, into what, and when. */
export function MixFields({
  form,
  values,
  chemistries,
  chemistry,
  sources,
  source,
  now,
  onChemistry,
}: Props) {
  const { register, setValue, getValues, formState } = form;
  const { errors } = formState;
  const material = materialOf(values, chemistry);
  const setVolume = (ul: number): void => {
    setValue('volumeMl', String(ul / 1_000), { shouldValidate: true });
    setValue('sizeMl', String(ul / 1_000), { shouldValidate: true });
  };
  const materials = chemistry.document.materials.map(({ material: value }) => ({
    value,
    label: materialLabels[value],
  }));
  return (
    <Stack gap="5">
      <SelectField
        label="What"
        error={errors.chemistryId?.message}
        options={chemistries.map(({ id, document }) => ({ value: id, label: document.name }))}
        {...register('chemistryId', {
          onChange: (event: { target: { value: string } }) => onChemistry(event.target.value),
        })}
      />
      {materials.length > 1 && (
        <SelectField
          label="For"
          options={materials}
          error={errors.material?.message}
          {...register('material')}
        />
      )}
      <RadioRows legend="From" options={sources} error={errors.from?.message} {...register('from')} />
      <Stack gap="2">
        <TextField
          label="How much"
          unit="mL"
          inputMode="numeric"
          error={errors.volumeMl?.message}
          help={source.maxUl ? `This makes up to ${showVolume(source.maxUl)}.` : undefined}
          {...register('volumeMl', {
            deps: ['sizeMl'],
            validate: (text) => checkVolume(text, chemistry, source, material),
          })}
        />
        <VolumeChips source={source} onPick={setVolume} />
      </Stack>
      <Grid templateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="3">
        <SelectField label="Into" options={kinds} error={errors.kind?.message} {...register('kind')} />
        <TextField
          label="Size of it"
          unit="mL"
          inputMode="numeric"
          error={errors.sizeMl?.message}
          {...register('sizeMl', { validate: (text) => checkSize(text, getValues('volumeMl')) })}
        />
      </Grid>
      <RadioRows
        legend="Mixed"
        options={[
          { value: 'now', label: 'Now' },
          { value: 'earlier', label: 'Earlier' },
        ]}
        {...register('when')}
      />
      {values.when === 'earlier' && (
        <TextField
          label="Day and time"
          type="datetime-local"
          error={errors.mixedAt?.message}
          {...register('mixedAt', {
            validate: (wall) => {
              if (wall === '') return 'Say when it was mixed.';
              return wall.slice(0, 10) <= now || 'It cannot have been mixed after today.';
            },
          })}
        />
      )}
      <TextField label="Note" error={errors.note?.message} {...register('note')} />
    </Stack>
  );
}
