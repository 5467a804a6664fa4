import { Injectable } from '@nestjs/common';
import { createTransport } from 'nodemailer';
import { Environment } from '../../config/environment.js';
import { Clock } from '../clock/clock.js';

/** A mail as it goes over the wire. */
export interface Letter {
  toAddress: string;
  replyTo: string | null;
  subject: string;
  body: string;
  messageId: string;
}

/** How a conversation ended. */
export type Sent =
  | { ok: true; answer: string }
  /** `unclear`: the whole mail was handed over and no answer came; it may have arrived. */
  | { ok: false; answer: string; unclear: boolean };

/** Speaks to the mail server. */
@Injectable()
export class Mailer {
  constructor(
    private readonly environment: Environment,
    private readonly clock: Clock,
  ) {}

  /**
   * Sends one mail within the deadline, which counts the whole conversation; at its end the socket is destroyed.
   * @returns the server's answer to the end of the mail, its refusal, or what the network said
   */
  async send(letter: Letter): Promise<Sent> {
    const deadline = new AbortController();
    const { mailDeadlineS } = this.environment;
    const timer = setTimeout(() => deadline.abort(), mailDeadlineS * 1_000);
    let handedOver = false;
    try {
      const transport = this.connectWhere(() => (handedOver = true));
      const sent = await transport.sendMail({ ...this.write(letter), signal: deadline.signal });
      return { ok: true, answer: sent.response };
    } catch (error) {
      const said = error instanceof Error ? error.message : String(error);
      return {
        ok: false,
        answer: deadline.signal.aborted ? `The mail server took longer than ${mailDeadlineS} s.` : said,
        unclear: handedOver && !isAnswer(error),
      };
    } finally {
      clearTimeout(timer);
    }
  }

  /** @param onHandedOver once the last of the mail was read: from then on the server may have all of it */
  private connectWhere(onHandedOver: () => void) {
    const transport = createTransport({
      url: this.environment.smtpUrl,
      // Without a wait for the other side: what the deadline cuts off must not linger.
      socketCloseTimeout: 0,
    });
    transport.use('stream', (mail, done) => {
      mail.message.processFunc((lines) => lines.once('end', onHandedOver));
      done();
    });
    return transport;
  }

  private write(letter: Letter) {
    return {
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
    };
  }
}

/** A refusal in the server's own words leaves nothing open: it has not taken the mail. */
const isAnswer = (error: unknown): boolean =>
  error instanceof Error && 'responseCode' in error && typeof error.responseCode === 'number';
