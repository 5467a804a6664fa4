import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { readEnvironment } from '../../config/environment.js';
import { createApp } from '../../create-app.js';
import { buildOpenApi } from './open-api.js';

const nowhere = 'postgres://nobody@127.0.0.1:1/none';
const committed = join(process.cwd(), 'packages/api-client/openapi.json');

describe('the OpenAPI document', () => {
  it('is the one that the clients’ types are made from (npm run api-client makes both anew)', async () => {
    const app = await createApp(
      readEnvironment({
        MODE: 'test',
        DATABASE_URL: nowhere,
        DATABASE_JOBS_URL: nowhere,
        SESSION_SECRET: '-'.repeat(32),
      }),
    );
    const built: unknown = JSON.parse(JSON.stringify(buildOpenApi(app)));
    expect(built).toEqual(JSON.parse(await readFile(committed, 'utf8')));
  });
});
