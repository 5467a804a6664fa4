import { eventKinds, type EventKind } from '@wetside/db';
import { Choice, Id, Instant, ListOf, Nested, Text, WholeNumber } from '../../platform/dto/fields.js';

export const VERBS = ['discard', 'mix', 'release', 'order', 'decide', 'look'] as const;
export type Verb = (typeof VERBS)[number];

const MOST = 1_000_000;

export class NeedsYouBottleView {
  @Id()
  id: string;

  @Text({ max: 12 })
  code: string;

  /** The chemistry's. */
  @Text({ max: 200 })
  name: string;
}

export class NeedsYouPackView {
  @Id()
  id: string;

  @Text({ max: 200 })
  name: string;
}

export class NeedsYouLoadView {
  @Id()
  actionId: string;

  /** Who recorded it. */
  @Text({ max: 80 })
  by: string;

  @Text({ max: 500 })
  sentence: string;
}

/** One thing that somebody should see to. */
export class NeedsYouRowView {
  @Id()
  eventId: string;

  @Choice(eventKinds)
  kind: EventKind;

  /** The next gravest that is open about the same bottle or pack. */
  @Choice(eventKinds, { optional: true })
  also?: EventKind;

  @Instant()
  openedAt: string;

  /** Which crossing of this kind it is, from 1. */
  @WholeNumber({ min: 1, max: MOST })
  crossing: number;

  @Text({ max: 500 })
  sentence: string;

  /** The figures behind it, and to how many it was mailed. */
  @Text({ max: 500 })
  why: string;

  /** Mails that the mail server has taken. */
  @WholeNumber({ min: 0, max: MOST })
  mailedTo: number;

  @Nested(() => NeedsYouBottleView, { optional: true })
  bottle?: NeedsYouBottleView;

  @Nested(() => NeedsYouPackView, { optional: true })
  pack?: NeedsYouPackView;

  @Nested(() => NeedsYouLoadView, { optional: true })
  load?: NeedsYouLoadView;

  @Choice(VERBS)
  verb: Verb;
}

export class NeedsYouView {
  @ListOf(() => NeedsYouRowView, { max: MOST })
  open: NeedsYouRowView[];
}
