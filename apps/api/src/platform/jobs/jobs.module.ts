import { Global, Module } from '@nestjs/common';
import { JobRunner } from './job-runner.js';
import { JobTasks } from './job-tasks.js';
import { NextCheck } from './next-check.js';
import { Queue } from './queue.js';

@Global()
@Module({ providers: [Queue, JobTasks, JobRunner, NextCheck], exports: [Queue, JobTasks, NextCheck] })
export class JobsModule {}
