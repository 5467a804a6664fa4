import { mayVoid } from './undo-rule.js';

const recordedAt = new Date('2026-03-10T00:00:00.000Z');
const noon = new Date('2026-03-10T12:00:00.000Z');
const later = new Date(noon.getTime() + 1);
const action = { membershipId: 'ada', recordedAt };

describe('who may take an action back', () => {
  it('oneself for 12 hours to the millisecond', () => {
    expect(mayVoid(action, { membershipId: 'ada', role: 'member' }, noon)).toBe('yes');
    expect(mayVoid(action, { membershipId: 'ada', role: 'member' }, later)).toBe('too-late');
  });

  it('not another member', () => {
    expect(mayVoid(action, { membershipId: 'jonas', role: 'member' }, recordedAt)).toBe('not-yours');
  });

  it.each(['technician', 'manager'] as const)('a %s at any time', (role) => {
    expect(mayVoid(action, { membershipId: 'jonas', role }, later)).toBe('yes');
  });
});
