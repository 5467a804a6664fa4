import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { text } from 'node:stream/consumers';
import { parseBehaviour, type Behaviour } from './behaviour.js';
import { inboxCss, inboxPage } from './inbox.page.js';
import type { MailStore } from './mail.store.js';

export interface InboxEnd {
  port: number;
  close(): Promise<void>;
}

interface Answer {
  status: number;
  type: string;
  body: string;
}

const json = (value: unknown, status = 200): Answer => ({
  status,
  type: 'application/json; charset=utf-8',
  body: JSON.stringify(value),
});
const trouble = (status: number, sentence: string): Answer => json({ error: sentence }, status);

/** The inbox page and its JSON, on `host`. */
export async function startInbox(
  host: string,
  port: number,
  store: MailStore,
  behaviour: Behaviour,
): Promise<InboxEnd> {
  const server = createServer((request, response) => {
    answerTo(request, store, behaviour)
      .catch((error: unknown) => trouble(500, String(error)))
      .then((answer) => send(response, answer))
      .catch(() => response.destroy());
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve();
    });
  });
  return {
    port: (server.address() as AddressInfo).port,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

function send(response: ServerResponse, answer: Answer): void {
  response.writeHead(answer.status, {
    'content-type': answer.type,
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    'content-security-policy': "default-src 'none'; style-src 'self'; frame-ancestors 'none'",
  });
  response.end(answer.body);
}

/** Mails carry sign-in links: a page of another site must not read them through a name that leads here. */
function isForeign(request: IncomingMessage): boolean {
  const name = (request.headers.host ?? '').replace(/:\d+$/, '');
  if (name !== 'localhost' && name !== '127.0.0.1') return true;
  const site = request.headers['sec-fetch-site'];
  return request.method !== 'GET' && site !== undefined && site !== 'same-origin' && site !== 'none';
}

async function answerTo(request: IncomingMessage, store: MailStore, behaviour: Behaviour): Promise<Answer> {
  if (isForeign(request)) return trouble(403, 'Ask from this machine, by localhost or 127.0.0.1.');
  const url = new URL(request.url ?? '/', 'http://localhost');
  const number = /^\/messages\/(\d+)$/.exec(url.pathname)?.[1];
  switch (`${request.method} ${number ? '/messages/:n' : url.pathname}`) {
    case 'GET /':
      return { status: 200, type: 'text/html; charset=utf-8', body: inboxPage(store.list()) };
    case 'GET /inbox.css':
      return { status: 200, type: 'text/css; charset=utf-8', body: inboxCss };
    case 'GET /messages':
      return json(
        store.list({
          to: url.searchParams.get('to') ?? undefined,
          subject: url.searchParams.get('subject') ?? undefined,
        }),
      );
    case 'GET /messages/:n': {
      const mail = store.get(Number(number));
      return mail ? json(mail) : trouble(404, 'There is no mail of that number.');
    }
    case 'DELETE /messages':
      await store.clear();
      return json({ deleted: true });
    case 'GET /behaviour':
      return json(behaviour.state());
    case 'POST /behaviour':
      return setBehaviour(await text(request), behaviour);
    default:
      return trouble(404, 'There is nothing at this address.');
  }
}

function setBehaviour(body: string, behaviour: Behaviour): Answer {
  let value: unknown;
  try {
    value = JSON.parse(body);
  } catch {
    return trouble(400, 'The body is not JSON.');
  }
  const order = parseBehaviour(value);
  if (typeof order === 'string') return trouble(400, order);
  behaviour.set(order);
  return json(behaviour.state());
}
