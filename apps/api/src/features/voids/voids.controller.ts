import { Body, Controller, Param, Put } from '@nestjs/common';
import { ApiResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { PutVoidDto, VoidAnswer } from './void.dto.js';
import { VoidsService } from './voids.service.js';

@ApiTags('voids')
@Controller('darkrooms/:darkroomId/voids')
export class VoidsController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly voids: VoidsService,
  ) {}

  @Put(':actionId')
  @LeastRole('member')
  @ApiResponse({ status: 200, type: VoidAnswer })
  @ApiResponse({ status: 201, type: VoidAnswer })
  put(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutVoidDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<VoidAnswer>> {
    return this.voids.put(entranceOf(this.access, caller, darkroomId), { id, kind: 'void', raw, ...body });
  }
}
