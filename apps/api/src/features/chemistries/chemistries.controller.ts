import { Controller, Get, Param } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { ChemistriesService } from './chemistries.service.js';
import { ChemistriesAnswer } from './chemistry.view.js';

@ApiTags('chemistries')
@Controller('darkrooms/:darkroomId/chemistries')
export class ChemistriesController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly chemistries: ChemistriesService,
  ) {}

  @Get()
  @LeastRole('member')
  @ApiOkResponse({ type: ChemistriesAnswer })
  list(@Caller() caller: CallerInfo, @Param('darkroomId') darkroomId: string): Promise<ChemistriesAnswer> {
    return this.access.enter(caller, darkroomId, (tx, me) => this.chemistries.list(tx, me));
  }
}
