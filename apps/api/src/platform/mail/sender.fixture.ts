import { mails } from '@wetside/db';
import { startFaultySmtp, type FaultySmtp } from '@wetside/mail-catcher';
import { and, eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { Environment } from '../../config/environment.js';
import type { TestApp } from '../../testing/test-app.js';
import { Clock } from '../clock/clock.js';
import { JobTasks } from '../jobs/job-tasks.js';
import { NextCheck } from '../jobs/next-check.js';
import { Mailer } from './mailer.js';
import { MailsRepository, type MailKey, type MailRow } from './mails.repository.js';
import { OutgoingMail } from './outgoing-mail.service.js';
import { SendMailTask } from './send-mail.task.js';

const SECOND_MS = 1_000;

/** Something that sends mail, with a clock of its own: what a second server is to the rows of mails. */
export interface Sender {
  clock: Clock;
  task: SendMailTask;
}

/** One mail, the mail server that it goes to, and a sender for it. */
export class MailCase {
  private constructor(
    private readonly world: TestApp,
    readonly key: MailKey,
    public smtp: FaultySmtp,
    readonly deadlineS: number,
  ) {}

  static async post(
    world: TestApp,
    darkroomId: string,
    { deadlineS = 30, inMs = 0, smtp }: { deadlineS?: number; inMs?: number; smtp?: FaultySmtp } = {},
  ): Promise<MailCase> {
    const dedupeKey = v7();
    const mail = {
      darkroomId,
      kind: 'order' as const,
      toAddress: 'orders@quayside.example',
      subject: 'Order 0001',
      body: 'Two concentrates.',
      dedupeKey,
      dueAt: new Date(world.clock.now().getTime() + inMs),
    };
    const outgoing = world.app.get(OutgoingMail);
    await world.database.inDarkroom({ darkroomId }, (tx) => outgoing.post(tx, mail));
    const [row] = await world.database.inDarkroom({ darkroomId }, (tx) =>
      tx
        .select({ id: mails.id })
        .from(mails)
        .where(and(eq(mails.darkroomId, darkroomId), eq(mails.dedupeKey, dedupeKey))),
    );
    const key = { darkroomId, mailId: row?.id ?? '' };
    return new MailCase(world, key, smtp ?? (await startFaultySmtp()), deadlineS);
  }

  get url(): string {
    return `smtp://127.0.0.1:${this.smtp.port}`;
  }

  /** @param repository another in the place of the program's own */
  sender(aheadS = 0, repository: MailsRepository = this.world.app.get(MailsRepository)): Sender {
    const { app, database } = this.world;
    const clockOffset = this.world.clock.now().getTime() - new Clock(app.get(Environment)).now().getTime();
    const environment = { ...app.get(Environment), smtpUrl: this.url, mailDeadlineS: this.deadlineS };
    const clock = new Clock({ ...environment, clockOffset: clockOffset + aheadS * SECOND_MS });
    const mailer = new Mailer(environment, clock);
    const [outgoing, next] = [app.get(OutgoingMail), app.get(NextCheck)];
    const task = new SendMailTask(
      new JobTasks(),
      database,
      clock,
      repository,
      mailer,
      outgoing,
      next,
      environment,
    );
    return { clock, task };
  }

  run({ task }: Sender): Promise<void> {
    return task.run(this.key);
  }

  async row(): Promise<MailRow> {
    const { darkroomId, mailId } = this.key;
    const [row] = await this.world.database.inDarkroom({ darkroomId }, (tx) =>
      tx
        .select()
        .from(mails)
        .where(and(eq(mails.darkroomId, darkroomId), eq(mails.id, mailId))),
    );
    if (!row) throw new Error('The mail is lost.');
    return row;
  }

  /** The Message-IDs of all that arrived at its mail server, oldest first. */
  arrivedIds(): string[] {
    return this.smtp.arrived().map((mail) => /^message-id: *(\S+)/im.exec(mail)?.[1] ?? '');
  }

  /** The mail server away; `back` starts it again on the same port. */
  async goAway(): Promise<{ back: () => Promise<void> }> {
    const { port } = this.smtp;
    await this.smtp.close();
    return { back: async () => void (this.smtp = await startFaultySmtp(port)) };
  }
}
