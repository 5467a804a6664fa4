import type { INestApplication, Type } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import cookieParser from 'cookie-parser';
import { Logger } from 'nestjs-pino';
import { AppModule } from './app.module.js';
import type { Environment } from './config/environment.js';
import { refuseOpenRoutes } from './platform/auth/routes.js';
import { Clock } from './platform/clock/clock.js';
import { Database } from './platform/database/database.js';
import { refuseUnsafeDatabase } from './platform/database/start-checks.js';
import { RequestPipe } from './platform/dto/request-pipe.js';
import { ProblemFilter } from './platform/errors/problem.filter.js';
import { noStore, tellTime } from './platform/http/headers.js';
import { jsonOnly } from './platform/http/json-only.js';
import { securityHeaders } from './platform/http/security-headers.js';
import { answerUnreadable } from './platform/http/unreadable.js';
import { serveWeb } from './platform/http/web.js';
import { serveApiDocuments } from './platform/http/open-api.js';

const BODY_LIMIT = '256kb';

/**
 * The whole program, set up but not started: the server and every test build it here.
 * Nothing is connected before `startUp` (or `init`).
 * @param extra modules that a test brings along
 * @throws Error naming the routes that do not say who may call them.
 */
export async function createApp(
  environment: Environment,
  extra: readonly Type[] = [],
): Promise<NestExpressApplication> {
  const app = await NestFactory.create<NestExpressApplication>(AppModule.with(environment, extra), {
    bodyParser: false,
    bufferLogs: true,
    abortOnError: false,
  });
  app.useLogger(app.get(Logger));
  app.flushLogs();
  app.set('etag', false);
  app.set('trust proxy', environment.trustedProxy ?? false);
  app.setGlobalPrefix('api');
  app.use(tellTime(app.get(Clock)), securityHeaders(environment.publicOrigin), noStore, cookieParser());
  app.use(jsonOnly);
  app.useBodyParser('json', { limit: BODY_LIMIT });
  answerUnreadable(app.getHttpServer());
  app.useGlobalPipes(new RequestPipe());
  app.useGlobalFilters(new ProblemFilter());
  app.enableShutdownHooks();
  refuseOpenRoutes(app);
  if (environment.mode !== 'real') serveApiDocuments(app);
  if (environment.webDist !== null) serveWeb(app, environment.webDist);
  return app;
}

/**
 * Checks the database and lets the modules begin.
 * @throws UnsafeDatabase
 */
export async function startUp(app: INestApplication): Promise<void> {
  await refuseUnsafeDatabase(app.get(Database));
  await app.init();
}
