import { Behaviour, type BehaviourOrder, type BehaviourState } from './behaviour.js';
import { startInbox } from './inbox.server.js';
import { MailStore, type CaughtMail, type MailFilter } from './mail.store.js';
import { startSmtp } from './smtp.server.js';

export interface MailCatcherOptions {
  /** 0 takes any free port. */
  smtpPort: number;
  /** 0 takes any free port. */
  httpPort: number;
  /** Folder that keeps the mails, one file each; in memory when left out. */
  mailDir?: string;
}

export interface MailCatcher {
  smtpPort: number;
  httpPort: number;
  /** Oldest first. */
  messages(filter?: MailFilter): CaughtMail[];
  setBehaviour(order: BehaviourOrder): void;
  behaviour(): BehaviourState;
  clear(): Promise<void>;
  /** Cuts what is open and frees both ports. */
  close(): Promise<void>;
}

const HOST = '127.0.0.1';

/**
 * Starts an SMTP server and its inbox on loopback.
 * @throws the system's error (EADDRINUSE, …) when a port cannot be had; nothing is left listening then.
 */
export async function startMailCatcher(options: MailCatcherOptions): Promise<MailCatcher> {
  const store = await MailStore.open(options.mailDir ?? null);
  const behaviour = new Behaviour();
  const smtp = await startSmtp(HOST, options.smtpPort, store, behaviour);
  const inbox = await startInbox(HOST, options.httpPort, store, behaviour).catch(async (error: unknown) => {
    await smtp.close();
    throw error;
  });
  return {
    smtpPort: smtp.port,
    httpPort: inbox.port,
    messages: (filter) => store.list(filter),
    setBehaviour: (order) => behaviour.set(order),
    behaviour: () => behaviour.state(),
    clear: () => store.clear(),
    close: async () => {
      await smtp.close();
      await inbox.close();
    },
  };
}
