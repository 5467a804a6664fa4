import { v7 } from 'uuid';
import type { Envelope } from '../api/types.js';
import { deviceMs, deviceNow } from '../clock/web-clock.js';

/** The id of something about to be done: made when its sheet opens, so that it is sent once. */
export const newId = (): string => v7();

export type ToldContent<Content> = Content & { v: 1; happenedAt: string };

export interface Told<Content> {
  actionId: string;
  /** Fixed at the first try: the same id never carries other content. */
  content: ToldContent<Content>;
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

/** How an action of one kind goes out: to its own address, with its own content. */
export type PutAction<Content, Answer> = (
  path: { darkroomId: string; actionId: string },
  body: { content: ToldContent<Content>; envelope: Envelope },
) => Promise<Answer>;

/** One try at sending. Each try has its own envelope. */
export function sendAction<Content, Answer>(
  put: PutAction<Content, Answer>,
  darkroomId: string,
  { actionId, content, toldAtMs }: Told<Content>,
): Promise<Answer> {
  const now = deviceNow();
  const queued = deviceMs() - toldAtMs > WAITED_MS;
  const envelope = { sentAt: now, deviceNow: now, queued };
  return put({ darkroomId, actionId }, { content, envelope });
}
