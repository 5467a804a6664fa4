import { Controller, Get } from '@nestjs/common';
import { ApiOkResponse, ApiTags } from '@nestjs/swagger';
import { sql } from 'drizzle-orm';
import { Public } from '../auth/access.decorators.js';
import { Database } from '../database/database.js';
import { Flag } from '../dto/fields.js';
import { problem } from '../errors/problem.js';

class HealthView {
  @Flag()
  ok: boolean;
}

@ApiTags('health')
@Controller('health')
export class HealthController {
  constructor(private readonly database: Database) {}

  /** Whether the server answers and reaches its database. */
  @Get()
  @Public()
  @ApiOkResponse({ type: HealthView })
  async health(): Promise<HealthView> {
    try {
      await this.database.asIdentity((tx) => tx.execute(sql`select 1`), { readOnly: true });
    } catch {
      throw problem('unavailable');
    }
    return { ok: true };
  }
}
