import { Box } from '@chakra-ui/react';
import { useSearchParams } from 'react-router-dom';
import type { ChemistryView } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ForRole } from '../../../shared/darkroom/for-role.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useBottles } from '../../bottles/api/get-bottles.js';
import { useChemistries } from '../../chemistries/api/get-chemistries.js';
import { useShelf } from '../../shelf/api/get-shelf.js';
import { MixingTabs } from '../components/mixing-tabs.js';
import { NewMix } from '../components/new-mix.js';

/** The chemistry that the address asks for: by its id, or as that of a bottle. */
function useAskedFor(chemistries: readonly ChemistryView[]): ChemistryView | undefined {
  const [search] = useSearchParams();
  const bottles = useBottles();
  const like = bottles.data?.bottles.find(({ code }) => code === search.get('like'));
  return (
    chemistries.find(({ id }) => id === search.get('chemistry')) ??
    chemistries.find(
      ({ versionId, document }) =>
        like && (versionId === like.chemistryVersionId || document.name === like.name),
    ) ??
    chemistries[0]
  );
}

function Loaded({ chemistries }: { chemistries: readonly ChemistryView[] }) {
  const { zone } = useDarkroom();
  const shelf = useShelf();
  const first = useAskedFor(chemistries);
  if (!first) return <Box>This darkroom has no chemistries yet.</Box>;
  return (
    <Fetched query={shelf} what="the shelf" zone={zone}>
      {({ packs }) => <NewMix key={first.id} chemistries={chemistries} first={first} packs={packs} />}
    </Fetched>
  );
}

function NewMixForm() {
  const { zone } = useDarkroom();
  const query = useChemistries();
  return (
    <>
      <PageHeading title="Record a mix" />
      <MixingTabs current="new" />
      <Fetched query={query} what="the chemistries" zone={zone}>
        {({ chemistries }) => <Loaded chemistries={chemistries} />}
      </Fetched>
    </>
  );
}

export function NewMixPage() {
  return (
    <ForRole least="technician" what="Mixing">
      <NewMixForm />
    </ForRole>
  );
}
