import { ApiProperty } from '@nestjs/swagger';
import { Flag, Id, ListOf, LocalDateField, Nested, Text, WholeNumber } from '../../platform/dto/fields.js';
import { ActionContentDto } from '../../platform/ledger/action-content.dto.js';
import { ActionView } from '../../platform/ledger/action.view.js';
import { EnvelopeDto } from '../../platform/ledger/envelope.dto.js';
import { OrderView } from '../orders/order.view.js';
import { ShelfView } from './shelf.view.js';

/** A million of any currency with two decimals. */
const MOST_MINOR = 100_000_000;

export class ReceiptLineDto {
  @Id()
  packId: string;

  @Id({ optional: true })
  orderLineId?: string;

  /** A lot of that pack that is here already, or a new one. */
  @Id()
  lotId: string;

  @Text({ max: 60 })
  lotNumber: string;

  /** Null: nothing is printed on it. */
  @LocalDateField({ nullable: true })
  expiresOn: string | null;

  @WholeNumber({ min: 1, max: 999 })
  count: number;

  /** For one pack. Left out: the price on the order's line. */
  @WholeNumber({ min: 0, max: MOST_MINOR, optional: true, nullable: true })
  priceMinor?: number | null;
}

export class ReceiptContent extends ActionContentDto {
  @Id({ optional: true })
  orderId?: string;

  @ListOf(() => ReceiptLineDto, { min: 1, max: 40 })
  lines: ReceiptLineDto[];

  @Text({ max: 1_000, optional: true })
  note?: string;

  /** More came than is open on the order, and that is right. */
  @Flag({ optional: true })
  overDeliveryOk?: boolean;
}

export class PutReceipt {
  @Nested(() => ReceiptContent)
  content: ReceiptContent;

  @Nested(() => EnvelopeDto)
  envelope: EnvelopeDto;
}

export class ReceiptAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;

  @ApiProperty({ type: ShelfView })
  shelf: ShelfView;

  @ApiProperty({ type: OrderView, required: false })
  order?: OrderView;
}
