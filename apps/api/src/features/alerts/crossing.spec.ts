import { crossingStep, type Cause, type CrossingStep } from './crossing.js';

const causes: Cause[] = ['action', 'retraction', 'time'];

describe('the step of an event', () => {
  it.each(causes)('opens at the first crossing (%s)', (cause) => {
    expect(crossingStep(null, true, cause)).toBe('open-new');
    expect(crossingStep(null, false, cause)).toBe('nothing');
  });

  it.each(causes)('leaves alone what still holds, and ends what does not (%s)', (cause) => {
    expect(crossingStep({ endedBy: null }, true, cause)).toBe('nothing');
    expect(crossingStep({ endedBy: null }, false, cause)).toBe('end');
  });

  it.each(causes)('leaves ended what does not hold (%s)', (cause) => {
    expect(crossingStep({ endedBy: 'action' }, false, cause)).toBe('nothing');
  });

  it.each<[Cause, Cause, CrossingStep]>([
    ['action', 'action', 'open-new'],
    ['action', 'time', 'open-new'],
    ['action', 'retraction', 'reopen'],
    ['time', 'action', 'open-new'],
    ['time', 'time', 'open-new'],
    ['time', 'retraction', 'reopen'],
    ['retraction', 'action', 'reopen'],
    ['retraction', 'time', 'reopen'],
    ['retraction', 'retraction', 'reopen'],
  ])('ended by %s and crossed again by %s: %s', (endedBy, cause, step) => {
    expect(crossingStep({ endedBy }, true, cause)).toBe(step);
  });
});
