import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { TabLinks } from '../../../shared/ui/tab-links.js';

export function MixingTabs({ current }: { current: 'new' | 'chemistries' }) {
  const { address } = useDarkroom();
  return (
    <TabLinks
      label="Mixing"
      tabs={[
        { to: paths.newMix(address), words: 'Record a mix', current: current === 'new' },
        { to: paths.mixing(address), words: 'Chemistries', current: current === 'chemistries' },
      ]}
    />
  );
}
