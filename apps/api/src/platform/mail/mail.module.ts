import { Global, Module } from '@nestjs/common';
import { MailSettings, readMailSettings } from './mail-settings.js';
import { Mailer } from './mailer.js';
import { MailsRepository } from './mails.repository.js';
import { OutgoingMail } from './outgoing-mail.service.js';
import { SendMailTask } from './send-mail.task.js';

@Global()
@Module({
  providers: [
    { provide: MailSettings, useFactory: () => readMailSettings() },
    Mailer,
    MailsRepository,
    OutgoingMail,
    SendMailTask,
  ],
  exports: [OutgoingMail, SendMailTask],
})
export class MailModule {}
