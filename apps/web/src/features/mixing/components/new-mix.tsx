import { Box, Button, Grid, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { newId } from '../../../shared/actions/send-action.js';
import { showStrip } from '../../../shared/actions/strip.store.js';
import type { ChemistryView, ShelfPack } from '../../../shared/api/types.js';
import { useNow } from '../../../shared/clock/use-now.js';
import { toDeviceTime, today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ulFromMl } from '../../../shared/formats/amounts.js';
import { fromWallClock } from '../../../shared/formats/instants.js';
import { paths } from '../../../shared/routes/paths.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { showProblem } from '../../../shared/ui/form-problem.js';
import { SectionHeading } from '../../../shared/ui/page-heading.js';
import { usePutMix } from '../api/put-mix.js';
import { checkVolume, fieldOfMix, materialOf, mixContent, type MixForm, shownField } from '../mix-form.js';
import { type MixSource, mixSources } from '../mix-sources.js';
import { MixFields } from './mix-fields.js';
import { MixPreview } from './mix-preview.js';

interface Props {
  chemistries: readonly ChemistryView[];
  first: ChemistryView;
  packs: readonly ShelfPack[];
}

const ONE_LITRE = 1_000_000;
const defaultVolume = (source: MixSource | undefined): number =>
  source?.wholeUl ?? Math.min(source?.maxUl ?? ONE_LITRE, ONE_LITRE);

function startOf(chemistry: ChemistryView, source: MixSource | undefined): MixForm {
  const volumeMl = String(Math.floor(defaultVolume(source) / 1_000));
  return {
    chemistryId: chemistry.id,
    from: source?.value ?? 'hand',
    volumeMl,
    sizeMl: volumeMl,
    kind: 'bottle',
    material: '',
    when: 'now',
    mixedAt: '',
    note: '',
  };
}

/** The form of a mix beside what it will make. */
export function NewMix({ chemistries, first, packs }: Props) {
  const darkroom = useDarkroom();
  const navigate = useNavigate();
  const now = useNow();
  const date = today(darkroom.zone);
  const putMix = usePutMix();
  const [ids] = useState(() => ({ actionId: newId(), bottleId: newId() }));
  const form = useForm<MixForm>({ defaultValues: startOf(first, mixSources(first, packs, date)[0]) });
  const { control, getValues, handleSubmit, setError, reset, formState } = form;
  const values: MixForm = { ...getValues(), ...useWatch({ control }) };
  const chemistry = chemistries.find(({ id }) => id === values.chemistryId) ?? first;
  const sources = mixSources(chemistry, packs, date);
  const source = sources.find(({ value }) => value === values.from) ?? sources.at(-1);
  if (!source) return null;

  const material = materialOf(values, chemistry);
  const earlier = values.when === 'earlier' ? fromWallClock(values.mixedAt, darkroom.zone) : null;
  const chooseChemistry = (id: string): void => {
    const chosen = chemistries.find((one) => one.id === id) ?? first;
    const { when, mixedAt, note } = getValues();
    reset({ ...startOf(chosen, mixSources(chosen, packs, date)[0]), when, mixedAt, note });
  };
  const record = handleSubmit(async (filled) => {
    const content = mixContent(filled, ids.bottleId, chemistry, source);
    if (!content) return;
    try {
      const told = earlier ? { ...content, happenedAt: toDeviceTime(earlier) } : content;
      const { bottle } = await putMix.sendAndWait(ids.actionId, told);
      await navigate(paths.bottle(darkroom.address, bottle.code));
      showStrip({
        actionId: ids.actionId,
        state: 'done',
        words: `${bottle.code} is recorded.`,
        canUndo: true,
      });
    } catch (error) {
      showProblem(error, setError, (field, code) => shownField(fieldOfMix(field, code), filled, chemistry));
    }
  });
  const volumeUl = ulFromMl(values.volumeMl);
  const sizeUl = ulFromMl(values.sizeMl);
  const canShow =
    volumeUl !== null &&
    sizeUl !== null &&
    checkVolume(values.volumeMl, chemistry, source, material) === true;

  return (
    <form onSubmit={(event) => void record(event)} noValidate>
      <Grid templateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 1fr) minmax(0, 1fr)' }} gap="8">
        <Stack gap="5">
          <MixFields
            form={form}
            values={values}
            chemistries={chemistries}
            chemistry={chemistry}
            sources={sources}
            source={source}
            now={date}
            onChemistry={chooseChemistry}
          />
        </Stack>
        <Stack gap="5">
          <section aria-labelledby="happens">
            <SectionHeading id="happens">What will happen</SectionHeading>
            {canShow ? (
              <MixPreview
                chemistry={chemistry}
                source={source}
                volumeUl={volumeUl}
                container={{ sizeUl, kind: values.kind }}
                material={material}
                happenedAt={earlier ?? now}
              />
            ) : (
              <Box color="ink.muted">Say how much, and what it makes is shown here.</Box>
            )}
          </section>
          <FormError message={formState.errors.root?.message} />
          <Button type="submit" minH="13" loading={formState.isSubmitting} loadingText="Recording">
            Record {chemistry.nextCode}
          </Button>
        </Stack>
      </Grid>
    </form>
  );
}
