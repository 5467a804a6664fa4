import { Controller, Get, Param } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { MembershipView } from './people.dto.js';
import { PeopleService } from './people.service.js';

@ApiTags('people')
@Controller('darkrooms/:darkroomId/people')
export class PeopleController {
  constructor(private readonly service: PeopleService) {}

  @Get()
  @LeastRole('member')
  @ApiOkResponse({ type: MembershipView, isArray: true })
  list(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string): Promise<MembershipView[]> {
    return this.service.list(caller, darkroom);
  }
}
