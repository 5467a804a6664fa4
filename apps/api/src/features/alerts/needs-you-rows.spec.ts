import type { Told } from './mail-plan.js';
import { mailWords } from './needs-you-rows.js';

const mail = (mailState: Told['mailState'], unclearTries = 0, membershipId = 'ada'): Told => ({
  eventId: 'e',
  membershipId,
  mailId: `m-${membershipId}`,
  mailState,
  unclearTries,
});

describe('what a row says of its mail', () => {
  it.each([
    [[], 0, ''],
    [[mail('waiting')], 0, ''],
    [[mail('sent'), mail('sent', 0, 'ines')], 2, 'Mailed to 2'],
    [[mail('sent', 1), mail('sent', 0, 'ines')], 2, 'Mailed to 2. 1 mail may have arrived twice'],
    [[mail('sent', 1), mail('sent', 2, 'ines')], 2, 'Mailed to 2. 2 mails may have arrived twice'],
    [[mail('waiting', 1)], 0, '1 mail may have arrived and will be sent once more'],
    [[mail('leased', 1)], 0, '1 mail may have arrived and will be sent once more'],
    [[mail('failed')], 0, '1 mail could not be delivered'],
    [[mail('failed', 3)], 0, '1 mail may have arrived, no answer said so'],
    [[mail('withdrawn', 1)], 0, ''],
  ])('%j', (told, mailedTo, text) => {
    expect(mailWords(told)).toEqual({ mailedTo, text });
  });
});
