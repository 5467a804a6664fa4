import type { OrderView } from '../../shared/api/types.js';

/** How the mail to the supplier fares. */
export function mailWords({ state, lastAnswer, unclearTries }: NonNullable<OrderView['mail']>): string {
  const answer = lastAnswer ? ` (${lastAnswer})` : '';
  const arrived = unclearTries > 0;
  switch (state) {
    case 'waiting':
    case 'leased':
      return arrived
        ? `The mail may have arrived and will be sent once more${answer}.`
        : `The mail has not gone out yet${answer}.`;
    case 'sent':
      return arrived
        ? 'The mail server has taken the mail. It may have arrived twice: an earlier try ended without an answer.'
        : 'The mail server has taken the mail.';
    case 'failed':
      return arrived
        ? `The mail may have arrived, but no answer said so${answer}: ask the supplier.`
        : `The mail could not be sent${answer}: tell the supplier another way.`;
    case 'withdrawn':
      return arrived
        ? 'The mail was withdrawn, but may have arrived before.'
        : 'The mail was withdrawn before it went out.';
  }
}
