import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  pgSchema,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';

/** What stands outside any darkroom: who a person is, how they sign in, and the directory of darkrooms. */
export const identity = pgSchema('identity');

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

/** The only table of darkrooms; every darkroom_id in the program refers to it. */
export const darkrooms = identity.table(
  'darkrooms',
  {
    id: uuid('id').primaryKey(),
    shortName: text('short_name').notNull(),
    name: text('name').notNull(),
    zone: text('zone').notNull(),
    /** When time alone may next change what this darkroom should be told; null: nothing is due. */
    nextCheckAt: instant('next_check_at'),
    createdAt: instant('created_at').notNull(),
  },
  (t) => [
    unique('darkrooms_short_name').on(t.shortName),
    // A short name that looked like an id would make addresses ambiguous: 32 characters cannot hold a UUID.
    check(
      'darkrooms_short_name_shape',
      sql`${t.shortName} ~ '^[a-z0-9]+(-[a-z0-9]+)*$' and length(${t.shortName}) <= 32`,
    ),
    index('darkrooms_next_check').on(t.nextCheckAt),
  ],
);

export const people = identity.table(
  'people',
  {
    id: uuid('id').primaryKey(),
    /** Null once the account is deleted, so that the address can be used again. */
    email: text('email'),
    name: text('name').notNull(),
    createdAt: instant('created_at').notNull(),
    deletedAt: instant('deleted_at'),
  },
  (t) => [
    unique('people_email').on(t.email),
    check('people_email_lower', sql`${t.email} = lower(${t.email})`),
    check('people_email_or_deleted', sql`(${t.email} is null) = (${t.deletedAt} is not null)`),
  ],
);

export const credentials = identity.table(
  'credentials',
  {
    personId: uuid('person_id').primaryKey(),
    /** An argon2id string with its own parameters and salt. */
    passphraseHash: text('passphrase_hash').notNull(),
    changedAt: instant('changed_at').notNull(),
  },
  (t) => [
    foreignKey({ name: 'credentials_person', columns: [t.personId], foreignColumns: [people.id] }),
    check('credentials_argon2id', sql`${t.passphraseHash} like '$argon2id$%'`),
  ],
);

/** One sign-in on one device; all refresh tokens that follow from it are its family. */
export const sessions = identity.table(
  'sessions',
  {
    id: uuid('id').primaryKey(),
    personId: uuid('person_id').notNull(),
    createdAt: instant('created_at').notNull(),
    lastUsedAt: instant('last_used_at').notNull(),
    endedAt: instant('ended_at'),
    endedWhy: text('ended_why'),
  },
  (t) => [
    foreignKey({ name: 'sessions_person', columns: [t.personId], foreignColumns: [people.id] }),
    check(
      'sessions_ended_why',
      sql`${t.endedWhy} in ('signed-out', 'reuse', 'passphrase-changed', 'ended-elsewhere')`,
    ),
    check('sessions_ended', sql`(${t.endedAt} is null) = (${t.endedWhy} is null)`),
    index('sessions_by_person').on(t.personId),
  ],
);

export const refreshTokens = identity.table(
  'refresh_tokens',
  {
    /** SHA-256 of the token, in hex; the token itself is only ever in the cookie. */
    hash: text('hash').primaryKey(),
    sessionId: uuid('session_id').notNull(),
    predecessorHash: text('predecessor_hash'),
    createdAt: instant('created_at').notNull(),
    usedAt: instant('used_at'),
    /** Set when a successor (or a sibling) was used: from then on this token coming back is theft. */
    supersededAt: instant('superseded_at'),
  },
  (t) => [
    foreignKey({ name: 'refresh_tokens_session', columns: [t.sessionId], foreignColumns: [sessions.id] }),
    check('refresh_tokens_hash', sql`length(${t.hash}) = 64`),
    index('refresh_tokens_by_session').on(t.sessionId),
  ],
);

export const oneTimeCodes = identity.table(
  'one_time_codes',
  {
    hash: text('hash').primaryKey(),
    purpose: text('purpose').notNull(),
    personId: uuid('person_id'),
    /** Where the code was sent; it may be the address of somebody who has no account yet. */
    email: text('email').notNull(),
    createdAt: instant('created_at').notNull(),
    expiresAt: instant('expires_at').notNull(),
    usedAt: instant('used_at'),
  },
  (t) => [
    foreignKey({ name: 'one_time_codes_person', columns: [t.personId], foreignColumns: [people.id] }),
    check('one_time_codes_purpose', sql`${t.purpose} in ('reset', 'invitation', 'change-of-address')`),
    check('one_time_codes_hash', sql`length(${t.hash}) = 64`),
  ],
);

/** Counters behind the limits on guessing. A row may go once its window and its delay are past. */
export const rateCounters = identity.table(
  'rate_counters',
  {
    subject: text('subject').notNull(),
    key: text('key').notNull(),
    windowStart: instant('window_start').notNull(),
    count: integer('count').notNull(),
    blockedUntil: instant('blocked_until'),
  },
  (t) => [
    primaryKey({ name: 'rate_counters_pk', columns: [t.subject, t.key] }),
    check('rate_counters_count', sql`${t.count} >= 0`),
  ],
);
