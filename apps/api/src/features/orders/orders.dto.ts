import { orderStates } from '@wetside/db';
import { Choice, Id, ListOf, Nested, Text, WholeNumber } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';
import type { OrderState } from './order.view.js';

export const MOST_LINES = 40;
const MOST_REVISIONS = 2_147_483_647;

export class DraftLineDto {
  @Id()
  id: string;

  @Id()
  supplierPackId: string;

  @WholeNumber({ min: 1, max: 999 })
  count: number;
}

export class OrderDraftContent extends ActionContentDto {
  @Id()
  orderId: string;

  @Id()
  supplierId: string;

  @ListOf(() => DraftLineDto, { min: 1, max: MOST_LINES })
  lines: DraftLineDto[];
}

export class PutOrderDraft {
  @Nested(() => OrderDraftContent)
  content: OrderDraftContent;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class ChangedLineDto {
  @Id()
  id: string;

  @Id()
  supplierPackId: string;

  /** 0 takes the line out. */
  @WholeNumber({ min: 0, max: 999 })
  count: number;
}

export class ChangeOrder {
  @WholeNumber({ min: 1, max: MOST_REVISIONS })
  revision: number;

  @Text({ max: 1_000, optional: true, nullable: true })
  note?: string | null;

  /** Lines that are not named stay as they are. */
  @ListOf(() => ChangedLineDto, { max: MOST_LINES })
  lines: ChangedLineDto[];
}

export class OrderSendingContent extends ActionContentDto {
  @Id()
  orderId: string;

  @WholeNumber({ min: 1, max: MOST_REVISIONS })
  revision: number;
}

export class PutOrderSending {
  @Nested(() => OrderSendingContent)
  content: OrderSendingContent;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class OrderCancellationContent extends ActionContentDto {
  @Id()
  orderId: string;

  @Text({ max: 500 })
  reason: string;
}

export class PutOrderCancellation {
  @Nested(() => OrderCancellationContent)
  content: OrderCancellationContent;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class OrdersQuery {
  @Choice(orderStates, { optional: true })
  state?: OrderState;
}
