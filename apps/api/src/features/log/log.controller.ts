import { Controller, Get, Param, Query } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { LogEntries } from './log-entries.service.js';
import { LogAnswer, LogQuery } from './log.view.js';

const PAGE = 50;

@ApiTags('log')
@Controller('darkrooms/:darkroomId/log')
export class LogController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly log: LogEntries,
  ) {}

  @Get()
  @LeastRole('member')
  @ApiOkResponse({ type: LogAnswer })
  page(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @Query() query: LogQuery,
  ): Promise<LogAnswer> {
    return this.access.enter(caller, darkroomId, (tx, me) =>
      this.log.page(tx, me, query.cursor, query.limit ?? PAGE),
    );
  }
}
