import { Body, Controller, Get, Param, Put } from '@nestjs/common';
import { ApiCreatedResponse, ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { PutReceipt, ReceiptAnswer } from './receipt.dto.js';
import { ReceiptsService } from './receipts.service.js';
import { ShelfService } from './shelf.service.js';
import { ShelfView } from './shelf.view.js';

@ApiTags('shelf')
@Controller('darkrooms/:darkroomId')
export class ShelfController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly shelf: ShelfService,
    private readonly receipts: ReceiptsService,
  ) {}

  @Get('shelf')
  @LeastRole('technician')
  @ApiOkResponse({ type: ShelfView })
  read(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string): Promise<ShelfView> {
    return this.shelf.read(entranceOf(this.access, caller, darkroom));
  }

  @Put('receipts/:actionId')
  @LeastRole('technician')
  @ApiOkResponse({ type: ReceiptAnswer })
  @ApiCreatedResponse({ type: ReceiptAnswer })
  receive(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('actionId') id: string,
    @Body() { content, envelope }: PutReceipt,
    @RawContent() raw: unknown,
  ): Promise<Recorded<ReceiptAnswer>> {
    const put = { id, kind: 'receipt' as const, content, raw, envelope };
    return this.receipts.record(entranceOf(this.access, caller, darkroom), put);
  }
}
