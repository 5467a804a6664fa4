import type { mailKinds } from '@wetside/db';

export type MailKind = (typeof mailKinds)[number];

/** A mail as a feature hands it in. */
export interface NewMail {
  darkroomId: string;
  kind: MailKind;
  membershipId?: string;
  orderId?: string;
  toAddress: string;
  replyTo?: string;
  subject: string;
  /** Plain text. */
  body: string;
  /** Unique in the darkroom: the same key posted twice is one mail. */
  dedupeKey: string;
  /** Not before this. */
  dueAt: Date;
}
