export { startMailCatcher } from './catcher.js';
export type { MailCatcher, MailCatcherOptions } from './catcher.js';
export type { BehaviourCounters, BehaviourMode, BehaviourState } from './behaviour.js';
export type { CaughtMail } from './mail.store.js';
