import { Injectable } from '@nestjs/common';
import { sql } from 'drizzle-orm';
import { Environment } from '../../config/environment.js';
import type { Tx } from '../database/database.js';

export type JobPayload = Record<string, string>;

/** The door to the queue: a job is put in with the same transaction as what it is about, or not at all. */
@Injectable()
export class Queue {
  constructor(private readonly environment: Environment) {}

  /** @param delayMs a delay and not an instant, for the queue runs by the database's own clock */
  async enqueue(tx: Tx, task: string, payload: JobPayload, delayMs: number): Promise<void> {
    await this.enqueueAll(tx, task, [payload], delayMs);
  }

  /** All of them in one statement. */
  async enqueueAll(tx: Tx, task: string, payloads: readonly JobPayload[], delayMs: number): Promise<void> {
    if (payloads.length === 0 || !this.environment.background) return;
    const delay = `${Math.max(0, Math.ceil(delayMs))} milliseconds`;
    await tx.execute(sql`
      select graphile_worker.enqueue(${task}, job.payload, ${delay}::interval)
      from json_array_elements(${JSON.stringify(payloads)}::json) as job(payload)`);
  }
}
