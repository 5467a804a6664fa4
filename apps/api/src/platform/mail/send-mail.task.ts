import { Injectable, Logger, type OnModuleInit } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { setTimeout as later } from 'node:timers/promises';
import { Environment } from '../../config/environment.js';
import { Clock } from '../clock/clock.js';
import { Database, type Tx } from '../database/database.js';
import { JobTasks } from '../jobs/job-tasks.js';
import { NextCheck } from '../jobs/next-check.js';
import { waitAfter } from './back-off.js';
import { Mailer, type Sent } from './mailer.js';
import { MailsRepository, type MailKey, type MailRow, type Outcome } from './mails.repository.js';
import { OutgoingMail } from './outgoing-mail.service.js';
import { parseSendMail, SEND_MAIL } from './send-mail.job.js';

const LEASE_MS = 60_000;
const ANSWER_LENGTH = 500;
/** What is left of a lease when the deadline of the sending is over. */
const MARK_TRIES = 20;
const MARK_AGAIN_MS = 1_000;

interface Leased {
  row: MailRow;
  leaseId: string;
  /** This try included. */
  attempts: number;
}

/**
 * Sends one mail, if it is this one's turn. The queue may name a mail twice, late or never; the row decides. A server
 * that dies between the end of the mail and the mark leaves a dead lease: the same Message-ID goes out once more, and
 * that is counted.
 */
@Injectable()
export class SendMailTask implements OnModuleInit {
  private readonly log = new Logger(SendMailTask.name);

  constructor(
    private readonly tasks: JobTasks,
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly repository: MailsRepository,
    private readonly mailer: Mailer,
    private readonly outgoing: OutgoingMail,
    private readonly nextCheck: NextCheck,
    private readonly environment: Environment,
  ) {}

  onModuleInit(): void {
    this.tasks.register(SEND_MAIL, (payload) => this.run(parseSendMail(payload)));
  }

  async run(key: MailKey): Promise<void> {
    const leased = await this.lease(key);
    if (!leased) return;
    await this.markSurely(key, leased, await this.mailer.send(leased.row));
  }

  /** A busy database is asked again while the lease holds: a mail that is sent and not marked goes out once more. */
  private async markSurely(key: MailKey, leased: Leased, sent: Sent): Promise<void> {
    for (let tries = 1; ; tries += 1) {
      try {
        await this.mark(key, leased, sent);
        return;
      } catch (error) {
        if (tries >= MARK_TRIES) throw error;
        await later(MARK_AGAIN_MS);
      }
    }
  }

  private lease(key: MailKey): Promise<Leased | null> {
    return this.database.inDarkroom({ darkroomId: key.darkroomId }, async (tx) => {
      const now = this.clock.now();
      const row = await this.repository.takeDue(tx, key, now);
      if (!row) {
        const dueAt = await this.repository.waitsUntil(tx, key);
        // Told too early: the rest of its delay. One that is due and locked is in another's hands.
        if (dueAt && dueAt > now) await this.outgoing.remind(tx, [{ ...key, id: key.mailId, dueAt }]);
        return null;
      }
      const whyNot = await this.whyNot(tx, key, row);
      if (whyNot !== null) {
        await this.repository.withdraw(tx, key, whyNot);
        return null;
      }
      const leaseId = randomUUID();
      // From here, not from when this began to wait for the row.
      const leaseUntil = new Date(this.clock.now().getTime() + LEASE_MS);
      await this.repository.lease(tx, key, { leaseId, leaseUntil });
      await this.nextCheck.lower(tx, key.darkroomId, leaseUntil);
      return { row, leaseId, attempts: row.attempts + 1 };
    });
  }

  /** A cancellation is never overtaken: its own kind always goes out. */
  private async whyNot(tx: Tx, key: MailKey, row: MailRow): Promise<string | null> {
    if (row.kind === 'warning') return this.repository.whyNot(tx, key);
    const isCancelled = row.kind === 'order' && (await this.repository.orderState(tx, key)) === 'cancelled';
    return isCancelled ? 'the order was cancelled' : null;
  }

  private mark(key: MailKey, { row, leaseId, attempts }: Leased, sent: Sent): Promise<void> {
    return this.database.inDarkroom({ darkroomId: key.darkroomId }, async (tx) => {
      const now = this.clock.now();
      const lastAnswer = sent.answer.slice(0, ANSWER_LENGTH);
      const unclear = !sent.ok && sent.unclear;
      const set = async (outcome: Omit<Outcome, 'unclear'>): Promise<boolean> => {
        const own = await this.repository.settle(tx, key, leaseId, { lastAnswer, unclear, ...outcome });
        // Nothing to count here: whoever took the lease over has counted this try as one of unclear end.
        if (!own) this.log.warn(`Mail ${row.messageId}, try ${attempts}: its lease had run out meanwhile.`);
        return own;
      };
      if (sent.ok) {
        await set({ state: 'sent', sentAt: now });
        return;
      }
      const wait = waitAfter(attempts, this.environment.mailBackoffS);
      const arrived = unclear ? ' It may have arrived nevertheless.' : '';
      this.log.warn(`Mail ${row.messageId}, try ${attempts}: ${lastAnswer}${arrived}`);
      if (wait === null) {
        await set({ state: 'failed' });
        return;
      }
      const dueAt = new Date(now.getTime() + wait);
      if (!(await set({ state: 'waiting', dueAt }))) return;
      await this.outgoing.remind(tx, [{ darkroomId: key.darkroomId, id: key.mailId, dueAt }]);
      await this.nextCheck.lower(tx, key.darkroomId, dueAt);
    });
  }
}
