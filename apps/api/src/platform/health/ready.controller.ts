import { Controller, Get, Logger } from '@nestjs/common';
import { ApiExcludeController } from '@nestjs/swagger';
import { Public } from '../auth/access.decorators.js';
import { Database } from '../database/database.js';
import { problem } from '../errors/problem.js';
import { missingColumns } from './schema-current.js';

/** For whoever runs the server, not for its pages: no part of the documented API. */
@ApiExcludeController()
@Controller('ready')
export class ReadyController {
  private readonly log = new Logger(ReadyController.name);

  constructor(private readonly database: Database) {}

  /** Whether people can be let in: the database answers and has been brought to this version. */
  @Get()
  @Public()
  async ready(): Promise<{ ok: true }> {
    const missing = await this.missing();
    if (missing.length === 0) return { ok: true };
    // The log and not the answer: strangers may ask.
    this.log.error(
      `The database is not at this version, it has no ${missing.join(', ')}: run the migrations.`,
    );
    throw problem('unavailable');
  }

  private async missing(): Promise<string[]> {
    try {
      return await this.database.asIdentity((tx) => missingColumns(tx), { readOnly: true });
    } catch {
      throw problem('unavailable');
    }
  }
}
