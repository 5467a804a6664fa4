/** The queue's name for "look at this mail". */
export const SEND_MAIL = 'send_mail';

export type SendMailPayload = Record<'darkroomId' | 'mailId', string>;

/** @throws TypeError when it is none: the job is then a mistake, not bad luck. */
export function parseSendMail(payload: unknown): SendMailPayload {
  if (typeof payload === 'object' && payload !== null && 'darkroomId' in payload && 'mailId' in payload) {
    const { darkroomId, mailId } = payload;
    if (typeof darkroomId === 'string' && typeof mailId === 'string') return { darkroomId, mailId };
  }
  throw new TypeError('A send_mail job names a darkroom and a mail.');
}
