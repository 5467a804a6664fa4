import { Module } from '@nestjs/common';
import { LogController } from './log.controller.js';
import { LogEntries } from './log-entries.service.js';
import { LogRepository } from './log.repository.js';

@Module({ controllers: [LogController], providers: [LogEntries, LogRepository], exports: [LogEntries] })
export class LogModule {}
