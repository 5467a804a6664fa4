import { v7 } from 'uuid';
import { inDarkroom, request } from '../api/client.js';
import { deviceMs, deviceNow } from '../clock/web-clock.js';

/** The id of something about to be done: made when its sheet opens, so that it is sent once. */
export const newId = (): string => v7();

export interface Told<Content> {
  actionId: string;
  /** Fixed at the first try: the same id never carries other content. */
  content: Content & { v: 1; happenedAt: string };
  toldAtMs: number;
}

export const tell = <Content>(
  actionId: string,
  content: Content & { happenedAt?: string },
): Told<Content> => ({
  actionId,
  content: { v: 1, happenedAt: deviceNow(), ...content },
  toldAtMs: deviceMs(),
});

/** Later than this after it was told, an action counts as having waited here. */
const WAITED_MS = 5_000;

/** One try at sending. Each try has its own envelope. */
export function sendAction<Answer>(darkroom: string, plural: string, told: Told<unknown>): Promise<Answer> {
  const now = deviceNow();
  const queued = deviceMs() - told.toldAtMs > WAITED_MS;
  return request<Answer>('PUT', inDarkroom(darkroom, `/${plural}/${told.actionId}`), {
    content: told.content,
    envelope: { sentAt: now, deviceNow: now, queued },
  });
}
