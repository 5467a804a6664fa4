import { vi } from 'vitest';

export interface Asked {
  method: string;
  path: string;
  body: unknown;
}
type Answer = { status?: number; body?: unknown } | 'no signal';
export type Handler = (asked: Asked) => Answer | Promise<Answer>;

const answerOf = (answer: Exclude<Answer, 'no signal'>): Response => {
  const status = answer.status ?? 200;
  const headers = { 'content-type': status >= 400 ? 'application/problem+json' : 'application/json' };
  return new Response(status === 204 ? null : JSON.stringify(answer.body ?? {}), { status, headers });
};

/**
 * The network, and nothing above it. Keys are 'GET /me' or, for actions, 'PUT /darkrooms/harbour/loads/*'.
 * An address that no test named answers 404.
 */
export function fakeApi(handlers: Record<string, Handler>) {
  const asked: Asked[] = [];
  const fake = async (request: Request): Promise<Response> => {
    const { method } = request;
    const path = request.url.replace(/^.*\/api/, '');
    const text = await request.text();
    const body: unknown = text === '' ? undefined : JSON.parse(text);
    const one = { method, path, body };
    asked.push(one);
    const wild = `${method} ${path.replace(/\?.*$/, '').replace(/\/[^/]+$/, '/*')}`;
    const handler = handlers[`${method} ${path}`] ?? handlers[wild];
    if (!handler)
      return answerOf({ status: 404, body: { code: 'not-found', detail: 'There is nothing here.' } });
    const answer = await handler(one);
    if (answer === 'no signal') throw new TypeError('fetch failed');
    return answerOf(answer);
  };
  vi.stubGlobal('fetch', fake);
  return { asked, sent: (method: string) => asked.filter((one) => one.method === method) };
}

/** An answer that waits until the test lets it go. */
export function held<T>() {
  let release: (value: T) => void = () => undefined;
  const promise = new Promise<T>((resolve) => {
    release = resolve;
  });
  return { promise, release };
}
