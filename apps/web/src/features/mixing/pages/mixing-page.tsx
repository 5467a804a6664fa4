import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useChemistries } from '../../chemistries/api/get-chemistries.js';
import { ChemistryList } from '../../chemistries/components/chemistry-list.js';
import { MixingTabs } from '../components/mixing-tabs.js';

/** What this darkroom mixes, every figure with its source. */
export function MixingPage() {
  const { zone } = useDarkroom();
  const mayMix = useMay('technician');
  const query = useChemistries();
  return (
    <>
      <PageHeading
        title={mayMix ? 'Mixing' : 'Chemistries'}
        says="What this darkroom mixes, and where each figure was read."
      />
      {mayMix && <MixingTabs current="chemistries" />}
      <Fetched query={query} what="the chemistries" zone={zone}>
        {({ chemistries }) => <ChemistryList chemistries={chemistries} />}
      </Fetched>
    </>
  );
}
