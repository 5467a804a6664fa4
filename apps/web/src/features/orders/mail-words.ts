import type { OrderView } from '../../shared/api/types.js';

/** How the mail to the supplier fares. */
export function mailWords({ state, lastAnswer }: NonNullable<OrderView['mail']>): string {
  const answer = lastAnswer ? ` (${lastAnswer})` : '';
  switch (state) {
    case 'waiting':
    case 'leased':
      return `The mail has not gone out yet${answer}.`;
    case 'sent':
      return 'The mail server has taken the mail.';
    case 'failed':
      return `The mail could not be sent${answer}: tell the supplier another way.`;
    case 'withdrawn':
      return 'The mail was withdrawn before it went out.';
  }
}
