import { Sheet } from '../../../shared/ui/sheet.js';
import type { Standing } from '../../bottles/standing.js';
import type { LoadSheetState } from '../use-load-sheet.js';
import { LoadForm } from './load-form.js';
import { useRef } from 'react';

interface Props {
  sheet: LoadSheetState;
  standings: readonly Standing[];
}

/** Put a load through: from the foot button for all baths, from a row for that bottle. */
export function LoadSheet({ sheet, standings }: Props) {
  const confirm = useRef<HTMLButtonElement>(null);
  const { load } = sheet;
  const baths = load ? standings.filter(({ bottle }) => load.bottleIds.includes(bottle.id)) : [];
  const [only] = baths;
  const title =
    load?.bottleIds.length === 1 && only ? `${only.bottle.code} ${only.bottle.name}` : 'Put a load through';
  return (
    <Sheet open={load !== null} onClose={sheet.close} title={title} focusFirst={confirm}>
      {load && (
        <LoadForm key={load.actionId} load={load} baths={baths} onDone={sheet.close} confirmRef={confirm} />
      )}
    </Sheet>
  );
}
