import { Body, Controller, Get, Param, Patch, Put, Query } from '@nestjs/common';
import { ApiCreatedResponse, ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { DraftsService } from './drafts.service.js';
import { OneOrderAnswer, OrderActionAnswer, OrderAnswer, OrdersAnswer } from './order.view.js';
import {
  ChangeOrder,
  OrdersQuery,
  PutOrderCancellation,
  PutOrderDraft,
  PutOrderSending,
} from './orders.dto.js';
import { OrdersService } from './orders.service.js';
import { SendingService } from './sending.service.js';

@ApiTags('orders')
@Controller('darkrooms/:darkroomId')
export class OrdersController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly orders: OrdersService,
    private readonly drafts: DraftsService,
    private readonly sending: SendingService,
  ) {}

  @Get('orders')
  @LeastRole('technician')
  @ApiOkResponse({ type: OrdersAnswer })
  list(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @Query() { state }: OrdersQuery,
  ): Promise<OrdersAnswer> {
    return this.orders.list(entranceOf(this.access, caller, darkroom), state);
  }

  @Get('orders/:orderId')
  @LeastRole('technician')
  @ApiOkResponse({ type: OneOrderAnswer })
  one(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('orderId') id: string,
  ): Promise<OneOrderAnswer> {
    return this.orders.one(entranceOf(this.access, caller, darkroom), id);
  }

  @Patch('orders/:orderId')
  @LeastRole('technician')
  @ApiOkResponse({ type: OrderAnswer })
  change(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('orderId') id: string,
    @Body() change: ChangeOrder,
  ): Promise<OrderAnswer> {
    return this.drafts.change(entranceOf(this.access, caller, darkroom), id, change);
  }

  @Put('order-drafts/:actionId')
  @LeastRole('technician')
  @ApiOkResponse({ type: OrderActionAnswer })
  @ApiCreatedResponse({ type: OrderActionAnswer })
  draft(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('actionId') id: string,
    @Body() { content, envelope }: PutOrderDraft,
    @RawContent() raw: unknown,
  ): Promise<Recorded<OrderActionAnswer>> {
    const put = { id, kind: 'order-draft' as const, content, raw, envelope };
    return this.drafts.record(entranceOf(this.access, caller, darkroom), put);
  }

  @Put('order-sendings/:actionId')
  @LeastRole('manager')
  @ApiOkResponse({ type: OrderActionAnswer })
  @ApiCreatedResponse({ type: OrderActionAnswer })
  send(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('actionId') id: string,
    @Body() { content, envelope }: PutOrderSending,
    @RawContent() raw: unknown,
  ): Promise<Recorded<OrderActionAnswer>> {
    const put = { id, kind: 'order-send' as const, content, raw, envelope };
    return this.sending.send(entranceOf(this.access, caller, darkroom), put);
  }

  @Put('order-cancellations/:actionId')
  @LeastRole('manager')
  @ApiOkResponse({ type: OrderActionAnswer })
  @ApiCreatedResponse({ type: OrderActionAnswer })
  cancel(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('actionId') id: string,
    @Body() { content, envelope }: PutOrderCancellation,
    @RawContent() raw: unknown,
  ): Promise<Recorded<OrderActionAnswer>> {
    const put = { id, kind: 'order-cancel' as const, content, raw, envelope };
    return this.sending.cancel(entranceOf(this.access, caller, darkroom), put);
  }
}
