import { Injectable } from '@nestjs/common';
import { AddressesRepository, type Recipient } from '../../platform/auth/addresses.repository.js';
import type { Role } from '../../platform/auth/roles.js';
import { Environment } from '../../config/environment.js';
import type { Tx } from '../../platform/database/database.js';
import type { House } from '../../platform/house/house.repository.js';
import { OutgoingMail, type NewMail } from '../../platform/mail/outgoing-mail.service.js';
import type { Day } from './alert-words.js';
import type { Crossings } from './crossings.js';
import { EventsRepository } from './events.repository.js';
import { planMails, type MailPlan, type NewNotice } from './mail-plan.js';
import { WarningMailsRepository } from './warning-mails.repository.js';
import { warningMail } from './warning-mail.js';

/** In which darkroom, and when. */
export interface MailScene {
  house: House;
  now: Date;
  day: Day;
}

type Planned = { plan: MailPlan; words: { subject: string; body: string } };

/** Who gets warnings. */
const TOLD: readonly Role[] = ['technician', 'manager'];

/** Brings the mails in line with the events that opened and ended. */
@Injectable()
export class WarningMails {
  constructor(
    private readonly environment: Environment,
    private readonly events: EventsRepository,
    private readonly repository: WarningMailsRepository,
    private readonly addresses: AddressesRepository,
    private readonly outgoing: OutgoingMail,
  ) {}

  /** @returns when the first of its mails falls due; null when none was left to send */
  async follow(tx: Tx, scene: MailScene, list: readonly Crossings[]): Promise<Date | null> {
    const { darkroomId } = scene.house;
    const dueAt = new Date(scene.now.getTime() + this.environment.mailGraceS * 1_000);
    const ids = list.flatMap(({ open, ended }) => [...open.map(({ id }) => id), ...ended]);
    const told = await this.events.told(tx, darkroomId, ids);
    const planned = list.map((crossings) => this.plan(crossings, told, scene));
    for (const one of planned) await this.change(tx, darkroomId, one, dueAt);
    const woken = planned.flatMap(({ plan }) => plan.wake);
    await this.outgoing.remind(
      tx,
      woken.map((id) => ({ darkroomId, id, dueAt })),
    );
    const notices = await this.tell(
      tx,
      darkroomId,
      planned.filter(({ plan }) => plan.tellAll),
      dueAt,
    );
    await this.repository.note(tx, darkroomId, [...planned.flatMap(({ plan }) => plan.add), ...notices]);
    return woken.length + notices.length > 0 ? dueAt : null;
  }

  private plan(
    { subject, open, ended }: Crossings,
    told: Parameters<typeof planMails>[1],
    { house, day }: MailScene,
  ): Planned {
    const mine = new Set([...open.map(({ id }) => id), ...ended]);
    const plan = planMails(
      open,
      told.filter(({ eventId }) => mine.has(eventId)),
      subject.neverMail,
    );
    const kinds = plan.said.map(({ kind }) => kind);
    const origin = this.environment.publicOrigin;
    return {
      plan,
      words:
        kinds.length > 0 ? warningMail(subject, kinds, { house, origin, day }) : { subject: '', body: '' },
    };
  }

  private async change(tx: Tx, darkroomId: string, { plan, words }: Planned, dueAt: Date): Promise<void> {
    for (const because of new Set(plan.withdraw.map((one) => one.because))) {
      const ids = plan.withdraw.filter((one) => one.because === because).map(({ mailId }) => mailId);
      await this.repository.withdraw(tx, darkroomId, ids, because);
    }
    await this.repository.reword(tx, darkroomId, plan.reword, words);
    await this.repository.wake(tx, darkroomId, plan.wake, { ...words, dueAt });
  }

  /** One mail a person and subject, all of them in one go. */
  private async tell(
    tx: Tx,
    darkroomId: string,
    planned: readonly Planned[],
    dueAt: Date,
  ): Promise<NewNotice[]> {
    if (planned.length === 0) return [];
    const people = await this.addresses.withRoles(tx, darkroomId, TOLD);
    const letters = planned.flatMap((one) =>
      people.map((person) => ({ one, person, mail: letter(darkroomId, one, person, dueAt) })),
    );
    const added = await this.outgoing.add(
      tx,
      letters.map(({ mail }) => mail),
    );
    return letters.flatMap(({ one, person: { membershipId }, mail }) => {
      const mailId = added.get(mail.dedupeKey);
      return mailId === undefined
        ? []
        : one.plan.said.map(({ id }) => ({ eventId: id, membershipId, mailId }));
    });
  }
}

function letter(
  darkroomId: string,
  { plan, words }: Planned,
  { membershipId, address }: Recipient,
  dueAt: Date,
): NewMail {
  const dedupeKey = `event:${plan.said[0]?.id ?? ''}:${membershipId}`;
  return { darkroomId, kind: 'warning', membershipId, toAddress: address, ...words, dedupeKey, dueAt };
}
