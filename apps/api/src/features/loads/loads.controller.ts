import { Body, Controller, Param, Put } from '@nestjs/common';
import { ApiResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { DecisionsService } from './decisions.service.js';
import { PutDecisionDto, PutLoadDto } from './load.dto.js';
import { ActionAnswer, LoadAnswer } from './load.view.js';
import { LoadsService } from './loads.service.js';

@ApiTags('loads')
@Controller('darkrooms/:darkroomId')
export class LoadsController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly loads: LoadsService,
    private readonly decisions: DecisionsService,
  ) {}

  @Put('loads/:actionId')
  @LeastRole('member')
  @ApiResponse({ status: 200, type: LoadAnswer })
  @ApiResponse({ status: 201, type: LoadAnswer })
  putLoad(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutLoadDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<LoadAnswer>> {
    return this.loads.put(entranceOf(this.access, caller, darkroomId), { id, kind: 'load', raw, ...body });
  }

  @Put('decisions/:actionId')
  @LeastRole('technician')
  @ApiResponse({ status: 200, type: ActionAnswer })
  @ApiResponse({ status: 201, type: ActionAnswer })
  putDecision(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutDecisionDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<ActionAnswer>> {
    return this.decisions.put(entranceOf(this.access, caller, darkroomId), {
      id,
      kind: 'decision',
      raw,
      ...body,
    });
  }
}
