import type { EventKind } from '@wetside/db';
import { planMails, type Told } from './mail-plan.js';

const event = (kind: EventKind) => ({ id: `e-${kind}`, kind });
const told = (kind: EventKind, mailState: Told['mailState'], member = 'ada'): Told => ({
  eventId: `e-${kind}`,
  membershipId: member,
  mailId: `m-${kind}-${member}`,
  mailState,
  unclearTries: 0,
});
const nothing = { tellAll: false, wake: [], reword: [], add: [], withdraw: [] };

describe('the mails about one subject', () => {
  it('tells everybody of what nobody was told', () => {
    expect(planMails([event('low')], [], false)).toEqual({ ...nothing, said: [event('low')], tellAll: true });
  });

  it('says nothing of what is cheap to renew, and of nothing', () => {
    expect(planMails([event('spent')], [], true)).toEqual({ ...nothing, said: [] });
    expect(planMails([], [], false)).toEqual({ ...nothing, said: [] });
  });

  it.each(['waiting', 'leased', 'sent', 'failed'] as const)('does not say twice what is %s', (state) => {
    expect(planMails([event('low')], [told('low', state)], false)).toEqual({
      ...nothing,
      said: [event('low')],
    });
  });

  it('withdraws what waits when its condition has ended', () => {
    const plan = planMails([], [told('low', 'waiting'), told('low', 'sent', 'ines')], false);
    expect(plan.withdraw).toEqual([{ mailId: 'm-low-ada', because: 'the condition had ended' }]);
  });

  it('sends after all what was withdrawn unsent, and to nobody who had it', () => {
    const plan = planMails([event('low')], [told('low', 'withdrawn'), told('low', 'sent', 'ines')], false);
    expect(plan).toEqual({ ...nothing, said: [event('low')], wake: ['m-low-ada'] });
  });

  it('puts a graver mail in the place of a lesser one that waits', () => {
    const plan = planMails([event('low'), event('on-hold')], [told('low', 'waiting')], false);
    expect(plan).toEqual({
      ...nothing,
      said: [event('on-hold')],
      tellAll: true,
      withdraw: [{ mailId: 'm-low-ada', because: 'something graver is said instead' }],
    });
  });

  it('says the lesser when the graver has ended, if it was not said', () => {
    expect(planMails([event('low')], [told('on-hold', 'sent')], false).tellAll).toBe(true);
    expect(planMails([event('low')], [told('on-hold', 'sent'), told('low', 'sent')], false).tellAll).toBe(
      false,
    );
  });

  it('names a past date and a spent bottle in one mail while it waits', () => {
    const plan = planMails([event('spent'), event('past-date')], [told('spent', 'waiting')], false);
    expect(plan).toEqual({
      ...nothing,
      said: [event('past-date'), event('spent')],
      reword: ['m-spent-ada'],
      add: [{ eventId: 'e-past-date', membershipId: 'ada', mailId: 'm-spent-ada' }],
    });
  });

  it('does not write again when the date of a spent bottle passes later', () => {
    const plan = planMails([event('spent'), event('past-date')], [told('spent', 'sent')], false);
    expect(plan).toEqual({ ...nothing, said: [event('past-date'), event('spent')] });
  });

  it('words a waiting mail anew when one of its two conditions ends', () => {
    const both: Told[] = [
      told('spent', 'waiting'),
      { ...told('past-date', 'waiting'), mailId: 'm-spent-ada' },
    ];
    expect(planMails([event('past-date')], both, false)).toEqual({
      ...nothing,
      said: [event('past-date')],
      reword: ['m-spent-ada'],
    });
  });
});
