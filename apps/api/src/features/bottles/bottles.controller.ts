import { Controller, Get, Param, Query } from '@nestjs/common';
import { ApiOkResponse, ApiProperty, ApiTags } from '@nestjs/swagger';
import type { ChemistryDocument } from '@wetside/chemistry';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, type CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { Choice } from '../../platform/dto/fields.js';
import { LogEntries } from '../log/log-entries.service.js';
import { LogEntryView } from '../log/log.view.js';
import { BottlesAnswer, BottleView } from './bottle.view.js';
import { BottlesService } from './bottles.service.js';

class BottlesQuery {
  /** The bottles in use, unless all that ever were are asked for. */
  @Choice(['in-use', 'all'], { optional: true })
  state?: 'in-use' | 'all';
}

class BottleAnswer {
  @ApiProperty({ type: BottleView })
  bottle: BottleView;

  @ApiProperty({ type: 'object', additionalProperties: true })
  document: ChemistryDocument;

  @ApiProperty({ type: LogEntryView, isArray: true })
  history: LogEntryView[];

  @ApiProperty({ format: 'date' })
  today: string;
}

@ApiTags('bottles')
@Controller('darkrooms/:darkroomId/bottles')
export class BottlesController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly bottles: BottlesService,
    private readonly log: LogEntries,
  ) {}

  @Get()
  @LeastRole('member')
  @ApiOkResponse({ type: BottlesAnswer })
  list(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @Query() query: BottlesQuery,
  ): Promise<BottlesAnswer> {
    return this.access.enter(caller, darkroomId, (tx, me) =>
      this.bottles.list(tx, me, query.state ?? 'in-use'),
    );
  }

  /** By its id or by its code, in either case of letters. */
  @Get(':bottle')
  @LeastRole('member')
  @ApiOkResponse({ type: BottleAnswer })
  one(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroomId: string,
    @Param('bottle') bottle: string,
  ): Promise<BottleAnswer> {
    return this.access.enter(caller, darkroomId, async (tx, me) => {
      const found = await this.bottles.one(tx, me, bottle);
      return { ...found, history: await this.log.ofBottle(tx, me, found.bottle.id) };
    });
  }
}
