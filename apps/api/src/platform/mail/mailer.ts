import { Injectable } from '@nestjs/common';
import { createTransport } from 'nodemailer';
import { Environment } from '../../config/environment.js';
import { Clock } from '../clock/clock.js';
import { MailSettings } from './mail-settings.js';

/** A mail as it goes over the wire. */
export interface Letter {
  toAddress: string;
  replyTo: string | null;
  subject: string;
  body: string;
  messageId: string;
}

/** Speaks to the mail server. */
@Injectable()
export class Mailer {
  private readonly transport;

  constructor(
    private readonly environment: Environment,
    private readonly settings: MailSettings,
    private readonly clock: Clock,
  ) {
    this.transport = createTransport({
      url: environment.smtpUrl,
      // Without a wait for the other side: what the deadline cuts off must not linger.
      socketCloseTimeout: 0,
    });
  }

  /**
   * Sends one mail within the deadline, which counts the whole conversation; at its end the socket is destroyed.
   * @returns the server's answer to the end of the mail
   * @throws Error with the server's refusal, or what the network said
   */
  async send(letter: Letter): Promise<string> {
    const deadline = new AbortController();
    const { deadlineS } = this.settings;
    const timer = setTimeout(() => deadline.abort(), deadlineS * 1_000);
    try {
      const sent = await this.transport.sendMail({
        from: this.environment.mailFrom,
        to: { name: '', address: letter.toAddress },
        ...(letter.replyTo === null ? {} : { replyTo: { name: '', address: letter.replyTo } }),
        subject: letter.subject,
        text: letter.body,
        messageId: letter.messageId,
        date: this.clock.now(),
        headers: { 'Auto-Submitted': 'auto-generated' },
        disableFileAccess: true,
        disableUrlAccess: true,
        signal: deadline.signal,
      });
      return sent.response;
    } catch (error) {
      if (deadline.signal.aborted)
        throw new Error(`The mail server took longer than ${deadlineS} s.`, { cause: error });
      throw error;
    } finally {
      clearTimeout(timer);
    }
  }
}
