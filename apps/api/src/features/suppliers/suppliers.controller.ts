import { Body, Controller, Get, Param, Put } from '@nestjs/common';
import { ApiCreatedResponse, ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { LeastRole } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { DarkroomAccess } from '../../platform/auth/darkroom-access.js';
import { IdParam } from '../../platform/dto/id-param.js';
import type { Recorded } from '../../platform/ledger/action-recorder.js';
import { entranceOf } from '../../platform/ledger/entrance.js';
import { RawContent } from '../../platform/ledger/raw-content.decorator.js';
import { SettingChangesService } from './setting-changes.service.js';
import { PutSettingChange, SettingChangeAnswer, SuppliersAnswer } from './suppliers.dto.js';
import { SuppliersService } from './suppliers.service.js';

@ApiTags('suppliers')
@Controller('darkrooms/:darkroomId')
export class SuppliersController {
  constructor(
    private readonly access: DarkroomAccess,
    private readonly suppliers: SuppliersService,
    private readonly settings: SettingChangesService,
  ) {}

  @Get('suppliers')
  @LeastRole('technician')
  @ApiOkResponse({ type: SuppliersAnswer })
  list(@Caller() caller: CallerInfo, @Param('darkroomId') darkroom: string): Promise<SuppliersAnswer> {
    return this.suppliers.list(entranceOf(this.access, caller, darkroom));
  }

  @Put('setting-changes/:actionId')
  @LeastRole('technician')
  @ApiOkResponse({ type: SettingChangeAnswer })
  @ApiCreatedResponse({ type: SettingChangeAnswer })
  change(
    @Caller() caller: CallerInfo,
    @Param('darkroomId') darkroom: string,
    @IdParam('actionId') id: string,
    @Body() { content, envelope }: PutSettingChange,
    @RawContent() raw: unknown,
  ): Promise<Recorded<SettingChangeAnswer>> {
    const put = { id, kind: 'setting-change' as const, content, raw, envelope };
    return this.settings.record(entranceOf(this.access, caller, darkroom), put);
  }
}
