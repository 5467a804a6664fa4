import { Controller, Get } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { Public } from '../auth/access.decorators.js';
import { Flag } from '../dto/fields.js';

class HealthView {
  @Flag()
  ok: boolean;
}

@ApiTags('health')
@Controller('health')
export class HealthController {
  /** Whether the server is alive. A supervisor that restarts on a "no" must not do so because the database is away. */
  @Get()
  @Public()
  @ApiOkResponse({ type: HealthView })
  health(): HealthView {
    return { ok: true };
  }
}
