import { Body, Controller, Param, Put } from '@nestjs/common';
import { ApiResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { MixAnswer, PutMixDto } from './mix.dto.js';
import { MixesService } from './mixes.service.js';

@ApiTags('mixes')
@Controller('darkrooms/:darkroomId/mixes')
export class MixesController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly mixes: MixesService,
  ) {}

  @Put(':actionId')
  @LeastRole('technician')
  @ApiResponse({ status: 200, type: MixAnswer })
  @ApiResponse({ status: 201, type: MixAnswer })
  put(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @IdParam('actionId') id: string,
    @Body() body: PutMixDto,
    @RawContent() raw: unknown,
  ): Promise<Recorded<MixAnswer>> {
    return this.mixes.put(entranceOf(this.access, caller, darkroomId), { id, kind: 'mix', raw, ...body });
  }
}
