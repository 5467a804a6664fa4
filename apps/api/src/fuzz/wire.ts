import { Agent, request } from 'node:http';

/** A request as its bytes are written, so that what no library would send can be sent. */
export interface Sent {
  method: string;
  /** Path and query, percent signs and all. */
  target: string;
  headers: Readonly<Record<string, string>>;
  body: string | undefined;
}

export interface Answer {
  status: number;
  type: string;
  text: string;
}

/** Milliseconds after which an answer has failed to come. */
export const PATIENCE_MS = 5_000;

/** Sends to a server of this machine. @throws Error when no answer comes in time */
export function sender(port: number): { send(sent: Sent): Promise<Answer>; close(): void } {
  const agent = new Agent({ keepAlive: true, maxSockets: 4 });
  const send = ({ method, target, headers, body }: Sent) =>
    new Promise<Answer>((done, failed) => {
      const length = body === undefined ? {} : { 'content-length': String(Buffer.byteLength(body)) };
      const to = { host: '127.0.0.1', port, agent, method, path: target, timeout: PATIENCE_MS };
      const outgoing = request({ ...to, headers: { ...headers, ...length } }, (incoming) => {
        const parts: Buffer[] = [];
        incoming.on('data', (part: Buffer) => parts.push(part));
        incoming.on('error', failed);
        incoming.on('end', () => {
          const type = incoming.headers['content-type'] ?? '';
          done({ status: incoming.statusCode ?? 0, type, text: Buffer.concat(parts).toString('utf8') });
        });
      });
      outgoing.on('timeout', () => outgoing.destroy(new Error(`No answer within ${PATIENCE_MS} ms.`)));
      outgoing.on('error', failed);
      outgoing.end(body);
    });
  return { send, close: () => agent.destroy() };
}
