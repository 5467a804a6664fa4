import type { EventKind, mailStates } from '@wetside/db';
import { gravest } from './severity.js';

export interface OpenEvent {
  id: string;
  kind: EventKind;
}

/** That somebody was told of an event in a mail, and how far the mail has come. */
export interface Told {
  eventId: string;
  membershipId: string;
  mailId: string;
  mailState: (typeof mailStates)[number];
  /** Tries by which the mail may have arrived though no answer said so. */
  unclearTries: number;
}

export interface NewNotice {
  eventId: string;
  membershipId: string;
  mailId: string;
}

/** What is to be done with the mails about one subject. */
export interface MailPlan {
  /** What is said: the gravest events that are open. */
  said: OpenEvent[];
  /** Nobody was told of it yet: write to everybody who is to know. */
  tellAll: boolean;
  /** Withdrawn before it went out, and holding after all: these go out, with new words. */
  wake: string[];
  /** Waiting still, and another event is said in it too: new words. */
  reword: string[];
  /** Events that a mail names from now on. */
  add: NewNotice[];
  withdraw: { mailId: string; because: string }[];
}

const ENDED = 'the condition had ended';
const GRAVER = 'something graver is said instead';

/**
 * Brings mails in line with what is open about one subject. Who was told once is never told again of the same event;
 * a mail that waits for something which is no longer the gravest is withdrawn; one that was withdrawn unsent goes out
 * when its event is said again.
 */
export function planMails(open: readonly OpenEvent[], told: readonly Told[], neverMail: boolean): MailPlan {
  const said = neverMail ? [] : gravest(open);
  const isSaid = ({ eventId }: Told) => said.some(({ id }) => id === eventId);
  const relevant = told.filter(isSaid);
  const reached = new Set(
    relevant.filter(({ mailState }) => mailState !== 'withdrawn').map((one) => one.membershipId),
  );
  const wake = idsOf(
    relevant.filter((one) => one.mailState === 'withdrawn' && !reached.has(one.membershipId)),
  );
  const stillOpen = new Set(open.map(({ id }) => id));
  const stale = told.filter(
    (one) => one.mailState === 'waiting' && !relevant.some(({ mailId }) => mailId === one.mailId),
  );
  const carriers = relevant.filter((one) => one.mailState === 'waiting' || wake.includes(one.mailId));
  const add = missing(said, carriers, relevant);
  return {
    said,
    tellAll: said.length > 0 && relevant.length === 0,
    wake,
    reword: idsOf(
      carriers.filter((one) => one.mailState === 'waiting' && isChanged(one.mailId, { said, add, told })),
    ),
    add,
    withdraw: idsOf(stale).map((mailId) => ({
      mailId,
      because: stale.some((one) => one.mailId === mailId && stillOpen.has(one.eventId)) ? GRAVER : ENDED,
    })),
  };
}

const idsOf = (list: readonly Told[]): string[] => [...new Set(list.map(({ mailId }) => mailId))];

function missing(
  said: readonly OpenEvent[],
  carriers: readonly Told[],
  relevant: readonly Told[],
): NewNotice[] {
  const known = new Set(relevant.map(({ eventId, membershipId }) => `${eventId} ${membershipId}`));
  const found = new Map<string, NewNotice>();
  for (const { membershipId, mailId } of carriers) {
    for (const { id } of said) {
      const key = `${id} ${membershipId}`;
      if (!known.has(key)) found.set(key, { eventId: id, membershipId, mailId });
    }
  }
  return [...found.values()];
}

/** Whether the mail names more, or still names what has ended. */
function isChanged(
  mailId: string,
  { said, add, told }: { said: OpenEvent[]; add: NewNotice[]; told: readonly Told[] },
): boolean {
  const more = add.some((one) => one.mailId === mailId);
  const less = told.some((one) => one.mailId === mailId && !said.some(({ id }) => id === one.eventId));
  return more || less;
}
