import { Module } from '@nestjs/common';
import { ChemistriesModule } from '../chemistries/chemistries.module.js';
import { EventsRepository } from './events.repository.js';
import { FactsRepository } from './facts.repository.js';
import { NeedsYouController } from './needs-you.controller.js';
import { NeedsYouService } from './needs-you.service.js';
import { WarningMailsRepository } from './warning-mails.repository.js';
import { SweepRepository } from './sweep.repository.js';
import { SweepTimer } from './sweep-timer.js';
import { Sweeper } from './sweeper.js';
import { WarningMails } from './warning-mails.service.js';
import { WarningsService } from './warnings.service.js';

@Module({
  imports: [ChemistriesModule],
  controllers: [NeedsYouController],
  providers: [
    WarningsService,
    WarningMails,
    FactsRepository,
    EventsRepository,
    WarningMailsRepository,
    Sweeper,
    SweepRepository,
    SweepTimer,
    NeedsYouService,
  ],
  exports: [WarningsService, Sweeper],
})
export class AlertsModule {}
