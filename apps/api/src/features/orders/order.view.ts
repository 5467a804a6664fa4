import { ApiProperty } from '@nestjs/swagger';
import { mailStates, orderStates } from '@wetside/db';
import { ActionView } from '../../platform/ledger/action.view.js';

export type OrderState = (typeof orderStates)[number];
export type MailState = (typeof mailStates)[number];

export class OrderSupplierView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  name: string;

  @ApiProperty({ format: 'email' })
  email: string;
}

export class OrderLineView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty({ format: 'uuid' })
  supplierPackId: string;

  @ApiProperty({ format: 'uuid' })
  packId: string;

  @ApiProperty()
  packName: string;

  @ApiProperty({ description: 'What the supplier calls it.' })
  supplierName: string;

  @ApiProperty()
  count: number;

  @ApiProperty({ type: Number, nullable: true })
  priceMinor: number | null;

  @ApiProperty()
  received: number;

  @ApiProperty()
  cancelled: number;
}

export class OrderMailView {
  @ApiProperty({ enum: mailStates })
  state: MailState;

  @ApiProperty({ type: String, nullable: true, description: 'What the mail server said last.' })
  lastAnswer: string | null;

  @ApiProperty({ description: 'Tries by which the mail may have arrived though no answer said so.' })
  unclearTries: number;
}

export class OrderView {
  @ApiProperty({ format: 'uuid' })
  id: string;

  @ApiProperty()
  number: number;

  @ApiProperty({ example: '0007' })
  numberText: string;

  @ApiProperty({ type: OrderSupplierView })
  supplier: OrderSupplierView;

  @ApiProperty({ enum: orderStates })
  state: OrderState;

  @ApiProperty()
  currency: string;

  @ApiProperty({ type: String, nullable: true })
  note: string | null;

  @ApiProperty()
  revision: number;

  @ApiProperty()
  draftedBy: string;

  @ApiProperty({ format: 'date-time' })
  draftedAt: string;

  @ApiProperty({ type: String, nullable: true })
  sentBy: string | null;

  @ApiProperty({ type: String, format: 'date-time', nullable: true })
  sentAt: string | null;

  @ApiProperty({ type: Number, nullable: true, description: 'Null where a price is not known.' })
  totalMinor: number | null;

  @ApiProperty({ type: OrderLineView, isArray: true })
  lines: OrderLineView[];

  @ApiProperty({ type: OrderMailView, nullable: true, description: 'The newest mail to the supplier.' })
  mail: OrderMailView | null;
}

export class OrdersAnswer {
  @ApiProperty({ type: OrderView, isArray: true })
  orders: OrderView[];
}

export class OrderAnswer {
  @ApiProperty({ type: OrderView })
  order: OrderView;
}

export class OneOrderAnswer extends OrderAnswer {
  @ApiProperty({
    type: String,
    nullable: true,
    description: 'As it went out; of a draft, as you would send it.',
  })
  mailText: string | null;
}

export class OrderActionAnswer extends OrderAnswer {
  @ApiProperty({ type: ActionView })
  action: ActionView;
}
