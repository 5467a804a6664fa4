import { Injectable } from '@nestjs/common';

/** Does one job. What it throws puts the job back with a growing delay. */
export type JobTask = (payload: unknown) => Promise<void>;

/** What the queue's runner can do: each area says here what its own jobs are, as its module begins. */
@Injectable()
export class JobTasks {
  private readonly tasks = new Map<string, JobTask>();

  register(name: string, task: JobTask): void {
    if (this.tasks.has(name)) throw new Error(`Two areas do the job ${name}.`);
    this.tasks.set(name, task);
  }

  entries(): [string, JobTask][] {
    return [...this.tasks];
  }
}
