/** What stands on the shelf and what is coming, in whole packs. An opened pack does not count. */
export interface ShelfStanding {
  unopened: number;
  onOrder: number;
  reorderPoint?: number;
  upTo?: number;
}

export interface ReorderAdvice {
  due: boolean;
  /** Packs to order, 0 when nothing is due. */
  quantity: number;
  /** A plain sentence with the figures. */
  reason: string;
}

/**
 * Order when unopened + on order is 1 or fewer, up to 2 unopened. Our default, from the common practice of
 * keeping one in use and one on the shelf; no source.
 */
export const defaultRule = { reorderPoint: 1, upTo: 2 } as const;

const isCount = (value: number): boolean => Number.isSafeInteger(value) && value >= 0;

/** Whether to order and how many. Throws RangeError for counts that are none or a rule that never ends. */
export function reorderAdvice(shelf: ShelfStanding): ReorderAdvice {
  const { unopened, onOrder, reorderPoint = defaultRule.reorderPoint, upTo = defaultRule.upTo } = shelf;
  if (![unopened, onOrder, reorderPoint, upTo].every(isCount)) {
    throw new RangeError('packs are counted in whole numbers from 0');
  }
  if (upTo <= reorderPoint) throw new RangeError('the shelf is filled to more than its reorder point');
  const available = unopened + onOrder;
  const coming = onOrder > 0 ? ` and ${onOrder} on order` : '';
  const standing = `${unopened === 0 ? 'None' : unopened} on the shelf${coming}`;
  if (available > reorderPoint) {
    return { due: false, quantity: 0, reason: `${standing}: above the reorder point of ${reorderPoint}` };
  }
  return {
    due: true,
    quantity: upTo - available,
    reason: `${standing}: order at ${reorderPoint}, keep ${upTo}`,
  };
}
