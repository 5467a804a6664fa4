import type { EventKind, NeedsYouRow } from '../../shared/api/types.js';
import type { Shape } from '../../shared/ui/state-mark.js';

const shapes: Record<EventKind, Shape> = {
  spent: 'octagon',
  'past-date': 'octagon',
  'on-hold': 'octagon',
  'none-on-shelf': 'octagon',
  'kit-past-expiry': 'octagon',
  low: 'triangle',
  'near-date': 'triangle',
  'reorder-point': 'triangle',
  'kit-near-expiry': 'triangle',
  'test-due': 'triangle',
  'load-to-decide': 'none',
};
const order: readonly Shape[] = ['octagon', 'triangle', 'none'];

export const shapeOfEvent = (kind: EventKind): Shape => shapes[kind];

/** Octagons first, then triangles, then what is only to be decided; the longest open first. */
export const inUrgency = (rows: readonly NeedsYouRow[]): NeedsYouRow[] =>
  [...rows].sort(
    (a, b) =>
      order.indexOf(shapes[a.kind]) - order.indexOf(shapes[b.kind]) || a.openedAt.localeCompare(b.openedAt),
  );
