import { createApiClient } from '@wetside/api-client';
import { learnFromAnswer } from '../clock/web-clock.js';
import { isolateNames } from './isolate-names.js';
import { NetworkError, problemOf } from './problem.js';
import type { Refined } from './refined.js';

/** Sends one request and learns the server's time from its answer. */
async function send(request: Request): Promise<Response> {
  const response = await fetch(request);
  learnFromAnswer(response.headers.get('x-wetside-now'));
  return response;
}

const isSigningIn = (request: Request): boolean => new URL(request.url).pathname.startsWith('/api/sign-in');

/** A session that ran out is renewed, and the same request goes out once more. */
async function sendSignedIn(request: Request): Promise<Response> {
  if (isSigningIn(request)) return send(request);
  const again = request.clone();
  const response = await send(request);
  return response.status === 401 && (await refresh()) ? send(again) : response;
}

/** The API's paths, parameters, bodies and answers, as its own description has them. */
export const api = createApiClient(window.location.origin, sendSignedIn);

let refreshing: Promise<boolean> | null = null;

/** One refresh at a time, in this tab and between tabs: the predecessor of a used token ends the session. */
function refresh(): Promise<boolean> {
  const once = async (): Promise<boolean> => (await api.POST('/sign-in/refresh')).response.ok;
  const alone = async (): Promise<boolean> =>
    'locks' in navigator ? await navigator.locks.request('wetside-refresh', once) : await once();
  refreshing ??= alone().finally(() => {
    refreshing = null;
  });
  return refreshing;
}

interface Answer<T> {
  data?: T;
  error?: unknown;
  response: Response;
}

/** What came back. Throws ProblemError for an answer that says no, NetworkError when none came. */
export async function answered<T>(sent: Promise<Answer<T>>): Promise<Refined<T>> {
  const { data, error, response } = await sent.catch((cause: unknown) => {
    // No answer, or one that broke off on its way: either way nobody knows what became of the request.
    throw new NetworkError('no answer', { cause });
  });
  if (!response.ok) throw problemOf(response.status, error);
  return isolateNames(data) as Refined<T>;
}
