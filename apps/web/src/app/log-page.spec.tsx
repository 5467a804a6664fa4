import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { ActionView, LogEntry, LogPage } from '../shared/api/types.js';
import { fakeApi } from '../testing/fake-api.js';
import { actionView, darkroom, me } from '../testing/fixtures.js';
import { renderAt } from '../testing/render-at.js';

const tomas = { membershipId: 'm-2', displayName: 'Tomas' };
const entry = (sentence: string, action: Partial<ActionView>): LogEntry => ({
  action: { ...actionView(sentence, 'load'), ...action },
  sentence,
  codes: [],
  flags: [],
});

function logOf(entries: LogEntry[]): void {
  const page: LogPage = { entries, nextCursor: null };
  fakeApi({
    'GET /me': () => ({ body: me('technician') }),
    'GET /darkrooms/harbour': () => ({ body: darkroom('technician') }),
    'GET /darkrooms/harbour/log': () => ({ body: page }),
  });
  renderAt('/d/harbour/log');
}
const rowOf = async (sentence: string): Promise<HTMLElement> => {
  const rows = await screen.findAllByRole('listitem');
  const row = rows.find((one) => one.textContent.includes(sentence));
  if (!row) throw new Error(`no row says ${sentence}`);
  return row;
};

describe('the log', () => {
  it('offers no way back from an order that went out or was cancelled, whoever looks', async () => {
    logOf([
      entry('sent order 0007', { kind: 'order-send', canUndo: false }),
      entry('cancelled order 0006', { kind: 'order-cancel', by: tomas, canUndo: false }),
      entry('voided a load', { kind: 'void', canUndo: false }),
    ]);
    for (const sentence of ['sent order 0007', 'cancelled order 0006', 'voided a load']) {
      expect(within(await rowOf(sentence)).queryByRole('button')).not.toBeInTheDocument();
    }
  });

  it('offers Undo of one’s own and Void of another’s only where the server allows it', async () => {
    logOf([
      entry('1 roll of 120', {}),
      entry('2 rolls of 135', { by: tomas }),
      entry('3 rolls of 135', { by: tomas, canUndo: false }),
    ]);
    expect(within(await rowOf('1 roll of 120')).getByRole('button')).toHaveAccessibleName(
      'Undo: 1 roll of 120',
    );
    expect(within(await rowOf('2 rolls of 135')).getByRole('button')).toHaveAccessibleName(
      'Void: 2 rolls of 135',
    );
    expect(within(await rowOf('3 rolls of 135')).queryByRole('button')).not.toBeInTheDocument();
  });

  it('strikes through what was taken back, and offers nothing more there', async () => {
    const voidedBy = {
      actionId: 'v',
      at: actionView('v', 'void').happenedAt,
      displayName: 'Ada',
      reason: 'wrong bottle',
    };
    logOf([entry('4 rolls of 135', { by: tomas, voidedBy, canUndo: false })]);
    const row = await rowOf('4 rolls of 135');
    expect(row).toHaveTextContent(/voided \d\d:\d\d by Ada, wrong bottle/);
    expect(within(row).queryByRole('button')).not.toBeInTheDocument();
  });
});
