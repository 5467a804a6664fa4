import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { deviceNow, learnFromAnswer, reckonedNow, toDeviceTime, today } from './web-clock.js';

describe('the web’s clock', () => {
  beforeEach(() => {
    vi.useFakeTimers({ now: Date.parse('2026-12-01T22:50:00Z') });
  });
  afterEach(() => {
    learnFromAnswer(deviceNow());
    vi.useRealTimers();
  });

  it('learns the server’s time from an answer and leaves the device’s own alone', () => {
    learnFromAnswer('2026-12-01T23:05:00.000Z');
    expect(reckonedNow()).toBe('2026-12-01T23:05:00.000Z');
    expect(deviceNow()).toBe('2026-12-01T22:50:00.000Z');
    vi.advanceTimersByTime(60_000);
    expect(reckonedNow()).toBe('2026-12-01T23:06:00.000Z');
  });

  it('has the darkroom’s date by the server’s time', () => {
    expect(today('Europe/Amsterdam')).toBe('2026-12-01');
    learnFromAnswer('2026-12-01T23:05:00.000Z');
    expect(today('Europe/Amsterdam')).toBe('2026-12-02');
    expect(today('America/New_York')).toBe('2026-12-01');
  });

  it('tells an instant of the server’s time in the device’s', () => {
    learnFromAnswer('2026-12-01T23:05:00.000Z');
    expect(toDeviceTime('2026-12-01T23:05:00.000Z')).toBe(deviceNow());
  });

  it('keeps what it knew when an answer tells no time', () => {
    learnFromAnswer('2026-12-01T23:05:00.000Z');
    learnFromAnswer(null);
    learnFromAnswer('soon');
    expect(reckonedNow()).toBe('2026-12-01T23:05:00.000Z');
  });
});
