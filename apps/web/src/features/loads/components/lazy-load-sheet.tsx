import { type ComponentProps, lazy, Suspense, useEffect } from 'react';
import type { LoadSheet as Sheet } from './load-sheet.js';

const fetchSheet = async () => ({ default: (await import('./load-sheet.js')).LoadSheet });
const LoadSheetLater = lazy(fetchSheet);

/** The load sheet, fetched once the page stands: there before a thumb is, and not in the way of the first paint. */
export function LazyLoadSheet(props: ComponentProps<typeof Sheet>) {
  useEffect(() => {
    // A failed early fetch is no matter: opening the sheet asks again.
    fetchSheet().catch(() => undefined);
  }, []);
  if (props.sheet.load === null && !props.sheet.wasOpened) return null;
  return (
    <Suspense fallback={null}>
      <LoadSheetLater {...props} />
    </Suspense>
  );
}
