export { startMailCatcher } from './catcher.js';
export type { MailCatcher, MailCatcherOptions } from './catcher.js';
export type { BehaviourCounters, BehaviourMode, BehaviourState } from './behaviour.js';
export type { CaughtMail } from './mail.store.js';
export { smtpStages, startFaultySmtp } from './faulty.server.js';
export type { FaultySmtp, SmtpFault, SmtpStage } from './faulty.server.js';
