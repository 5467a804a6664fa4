import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { rememberChoice, rememberedChoice } from './remembered-choice.js';

const HOUR_MS = 3_600_000;
const two = { format: '120', filmClass: 'tabular-grain', count: 2 } as const;

beforeEach(() => {
  localStorage.clear();
  vi.useFakeTimers({ toFake: ['Date'] });
});
afterEach(() => vi.useRealTimers());

it('keeps format and class, and the count for 12 hours', () => {
  rememberChoice('m-1', two);
  vi.advanceTimersByTime(12 * HOUR_MS - 1);
  expect(rememberedChoice('m-1')).toEqual(two);
  vi.advanceTimersByTime(1);
  expect(rememberedChoice('m-1')).toEqual({ ...two, count: 1 });
});

it('keeps the sides of a sheet of another size', () => {
  const sheets = { format: 'sheet', filmClass: 'ortho', count: 6, widthMm: 100, heightMm: 150 } as const;
  rememberChoice('m-1', sheets);
  expect(rememberedChoice('m-1')).toEqual(sheets);
});

it('carries nothing over to another person', () => {
  rememberChoice('m-1', two);
  expect(rememberedChoice('m-2')).toEqual({ format: '135-36', filmClass: 'conventional', count: 1 });
});

it('starts plain from what it cannot read', () => {
  localStorage.setItem('wetside.load.m-1', '{"format":"9x9","filmClass":"none","count":1000,"atMs":"now"}');
  expect(rememberedChoice('m-1')).toEqual({ format: '135-36', filmClass: 'conventional', count: 1 });
  localStorage.setItem('wetside.load.m-1', 'not json');
  expect(rememberedChoice('m-1').count).toBe(1);
});
