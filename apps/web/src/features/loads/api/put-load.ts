import { chargeFor } from '@wetside/chemistry';
import type { ChemistryDocument } from '@wetside/chemistry';
import type { BottleChange } from '../../../shared/actions/pending.store.js';
import { settleBottles } from '../../../shared/actions/settle-bottles.js';
import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { LoadAnswer, LoadContent } from '../../../shared/api/types.js';

/** What a load does to its bottles, by the same rule as the server's. */
function changesOf(
  { bottleIds, film, material }: LoadContent,
  documentOf: (bottleId: string) => ChemistryDocument | undefined,
): BottleChange[] {
  return bottleIds.flatMap((bottleId) => {
    const document = documentOf(bottleId);
    if (!document) return [];
    const { countedE4 } = chargeFor(document, film, material);
    return [{ bottleId, fact: { kind: 'load', charges: [{ material, countedE4, takenUl: 0 }] } }];
  });
}

export const usePutLoad = (documentOf: (bottleId: string) => ChemistryDocument | undefined) =>
  useAction<LoadContent, LoadAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/loads/{actionId}', { params: { path }, body })),
    changes: (content) => changesOf(content, documentOf),
    settle: (client, darkroom, { bottles }) => settleBottles(client, darkroom, bottles),
    touches: ['bottles', 'bottle', 'log', 'needs-you'],
  });
