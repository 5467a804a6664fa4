import { Body, Controller, Param, Put } from '@nestjs/common';
import { ApiResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { PutDiscardDto, PutHoldDto } from './hold.dto.js';
import { BottleActionAnswer } from './hold.view.js';
import { HoldsService } from './holds.service.js';

@ApiTags('holds')
@ApiResponse({ status: 200, type: BottleActionAnswer })
@ApiResponse({ status: 201, type: BottleActionAnswer })
@Controller('darkrooms/:darkroomId')
export class HoldsController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly holds: HoldsService,
  ) {}

  /** Any member takes a bottle out of use. */
  @Put('holds/:actionId')
  @LeastRole('member')
  hold(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutHoldDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<BottleActionAnswer>> {
    return this.holds.hold(entranceOf(this.access, caller, darkroomId), { id, kind: 'hold', raw, ...body });
  }

  @Put('releases/:actionId')
  @LeastRole('technician')
  release(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutHoldDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<BottleActionAnswer>> {
    return this.holds.release(entranceOf(this.access, caller, darkroomId), {
      id,
      kind: 'release',
      raw,
      ...body,
    });
  }

  @Put('discards/:actionId')
  @LeastRole('technician')
  discard(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutDiscardDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<BottleActionAnswer>> {
    return this.holds.discard(entranceOf(this.access, caller, darkroomId), {
      id,
      kind: 'discard',
      raw,
      ...body,
    });
  }
}
