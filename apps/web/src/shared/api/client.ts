import { learnFromAnswer } from '../clock/web-clock.js';
import { NetworkError, problemOf } from './problem.js';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH';

async function send(method: Method, path: string, body?: unknown): Promise<Response> {
  const init: RequestInit = { method, credentials: 'same-origin', headers: { accept: 'application/json' } };
  if (body !== undefined) {
    init.headers = { accept: 'application/json', 'content-type': 'application/json' };
    init.body = JSON.stringify(body);
  }
  let response: Response;
  try {
    response = await fetch(`/api${path}`, init);
  } catch {
    throw new NetworkError('no answer');
  }
  learnFromAnswer(response.headers.get('x-wetside-now'));
  return response;
}

let refreshing: Promise<boolean> | null = null;

/** One refresh at a time, in this tab and between tabs: the predecessor of a used token ends the session. */
function refresh(): Promise<boolean> {
  const once = async (): Promise<boolean> => (await send('POST', '/sign-in/refresh')).ok;
  const alone = async (): Promise<boolean> =>
    'locks' in navigator ? await navigator.locks.request('wetside-refresh', once) : await once();
  refreshing ??= alone().finally(() => {
    refreshing = null;
  });
  return refreshing;
}

async function read<T>(response: Response): Promise<T> {
  if (!response.ok) throw await problemOf(response);
  if (response.status === 204) return undefined as T;
  return (await response.json()) as T;
}

/** Throws ProblemError for an answer that says no, NetworkError when none came. */
export async function request<T>(method: Method, path: string, body?: unknown): Promise<T> {
  const response = await send(method, path, body);
  if (response.status === 401 && !path.startsWith('/sign-in') && (await refresh())) {
    return read<T>(await send(method, path, body));
  }
  return read<T>(response);
}

export const get = <T>(path: string): Promise<T> => request<T>('GET', path);

/** The path of something inside a darkroom. */
export const inDarkroom = (darkroom: string, path: string): string =>
  `/darkrooms/${encodeURIComponent(darkroom)}${path}`;
