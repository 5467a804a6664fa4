import { Global, Module } from '@nestjs/common';
import { Mailer } from './mailer.js';
import { MailsRepository } from './mails.repository.js';
import { OutgoingMail } from './outgoing-mail.service.js';
import { SendMailTask } from './send-mail.task.js';

@Global()
@Module({
  providers: [Mailer, MailsRepository, OutgoingMail, SendMailTask],
  exports: [OutgoingMail, SendMailTask],
})
export class MailModule {}
