import type { INestApplicationContext } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import type { TestDatabase } from '@wetside/db/testing/clone';
import { AppModule } from '../../app.module.js';
import { readEnvironment } from '../../config/environment.js';

/** The program on that database without its pages, queue and sweep: its clock is moved to and fro. */
export function openProgram(db: TestDatabase): Promise<INestApplicationContext> {
  const settings = {
    MODE: 'test',
    PUBLIC_ORIGIN: 'http://localhost:55700',
    DATABASE_URL: db.appUrl,
    DATABASE_JOBS_URL: db.jobsUrl,
  };
  const environment = { ...readEnvironment(settings), background: false };
  return NestFactory.createApplicationContext(AppModule.with(environment), { logger: ['warn', 'error'] });
}
