import { Controller, Get, Param } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { NeedsYouView } from './needs-you.dto.js';
import { NeedsYouService } from './needs-you.service.js';

@ApiTags('warnings')
@Controller('darkrooms/:darkroomId/needs-you')
export class NeedsYouController {
  constructor(private readonly service: NeedsYouService) {}

  /** What is open and waits for somebody to see to it. */
  @Get()
  @LeastRole('technician')
  @ApiOkResponse({ type: NeedsYouView })
  list(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string): Promise<NeedsYouView> {
    return this.service.list(caller, darkroom);
  }
}
