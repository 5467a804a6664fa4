import { Controller, Get, Param } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomView } from './darkrooms.dto.js';
import { DarkroomsService } from './darkrooms.service.js';

@ApiTags('darkrooms')
@Controller('darkrooms/:darkroomId')
export class DarkroomsController {
  constructor(private readonly service: DarkroomsService) {}

  @Get()
  @LeastRole('member')
  @ApiOkResponse({ type: DarkroomView })
  find(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string): Promise<DarkroomView> {
    return this.service.find(caller, darkroom);
  }
}
