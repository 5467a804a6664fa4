import { Reader, type Variables } from '../../config/reader.js';

/** How hard the program tries to get a mail out. */
export class MailSettings {
  /** Seconds to wait after the first failure; later ones wait longer. */
  backoffS: number;
  /** Seconds for the whole conversation with the mail server, from dialling to its last answer. */
  deadlineS: number;
}

/**
 * Reads and checks MAIL_BACKOFF_S and MAIL_DEADLINE_S.
 * @throws ConfigError
 */
export function readMailSettings(variables: Variables = process.env): MailSettings {
  const read = new Reader(variables);
  const settings = new MailSettings();
  settings.backoffS = read.whole('MAIL_BACKOFF_S', { min: 0, max: 3_600, otherwise: 30 });
  // Below the lease of a minute: whoever holds a lease has let go of the socket before another may take it.
  settings.deadlineS = read.whole('MAIL_DEADLINE_S', { min: 1, max: 50, otherwise: 40 });
  read.finish();
  return settings;
}
