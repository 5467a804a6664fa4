import type { Server } from 'node:http';
import type { Duplex } from 'node:stream';
import { problem } from '../errors/problem.js';

/**
 * What Node's parser refuses reaches no handler, and Node would answer it without a word. An address or headers that are
 * too long get their reason in the same shape as everything else.
 */
export function answerUnreadable(server: Server): void {
  server.on('clientError', (error: NodeJS.ErrnoException, socket: Duplex) => {
    if (error.code === 'ECONNRESET' || !socket.writable || hasBegun(socket)) return void socket.destroy();
    if (error.code === 'ERR_HTTP_REQUEST_TIMEOUT')
      return void socket.end('HTTP/1.1 408 Request Timeout\r\nConnection: close\r\n\r\n');
    const found = problem(error.code === 'HPE_HEADER_OVERFLOW' ? 'too-large' : 'malformed');
    const body = JSON.stringify(found.toDocument());
    const head = [
      `HTTP/1.1 ${found.status} ${found.status === 413 ? 'Content Too Large' : 'Bad Request'}`,
      'Content-Type: application/problem+json; charset=utf-8',
      `Content-Length: ${Buffer.byteLength(body)}`,
      'Cache-Control: no-store',
      'Connection: close',
    ];
    socket.end(`${head.join('\r\n')}\r\n\r\n${body}`);
  });
}

/** An answer to an earlier request is on its way there: a second head inside it would be read as its body. */
function hasBegun(socket: Duplex): boolean {
  const answer = Reflect.get(socket, '_httpMessage') as { headersSent?: boolean } | null | undefined;
  return answer?.headersSent === true;
}
