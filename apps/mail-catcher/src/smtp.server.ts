import type { AddressInfo, Socket } from 'node:net';
import { buffer } from 'node:stream/consumers';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { Behaviour } from './behaviour.js';
import type { Envelope, MailStore } from './mail.store.js';

const TEN_MINUTES_MS = 600_000;
/** Between two lines of a slow answer: short enough that a sender's inactivity limit never fires. */
const SLOW_LINE_MS = 500;
/** Lines of a slow answer before it ends: a minute in all. */
const SLOW_LINES = 120;

export interface SmtpEnd {
  port: number;
  close(): Promise<void>;
}

/** Listens for SMTP on `host`; every mail goes to the store as the behaviour in force says. */
export async function startSmtp(
  host: string,
  port: number,
  store: MailStore,
  behaviour: Behaviour,
): Promise<SmtpEnd> {
  // By the sender's port: the session names it, and a drop needs the socket itself.
  const sockets = new Map<number, Socket>();
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    banner: 'Wetside mail catcher',
    disableReverseLookup: true,
    socketTimeout: TEN_MINUTES_MS,
    closeTimeout: 1,
    onConnect(_session, answer) {
      behaviour.counters.connections += 1;
      answer();
    },
    onData(stream, session, answer) {
      const socket = sockets.get(session.remotePort);
      receive(stream, session, socket, store, behaviour).then(
        (told) => {
          if (told) answer(told.error);
        },
        (error: unknown) => answer(error instanceof Error ? error : new Error(String(error))),
      );
    },
  });
  // A sender that hangs up in mid-mail is an everyday event for a catcher, not a failure.
  server.on('error', () => undefined);
  server.server.on('connection', (socket: Socket) => {
    const remotePort = socket.remotePort ?? 0;
    sockets.set(remotePort, socket);
    socket.on('close', () => sockets.delete(remotePort));
  });
  await listen(server, host, port);
  return {
    port: (server.server.address() as AddressInfo).port,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        for (const socket of sockets.values()) socket.destroy();
      }),
  };
}

function listen(server: SMTPServer, host: string, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(port, host, () => {
      server.server.off('error', reject);
      resolve();
    });
  });
}

/** Gives what to answer, or null when the sender gets no answer at all. */
async function receive(
  stream: SMTPServerDataStream,
  session: SMTPServerSession,
  socket: Socket | undefined,
  store: MailStore,
  behaviour: Behaviour,
): Promise<{ error: (Error & { responseCode?: number }) | null } | null> {
  const mode = behaviour.take();
  if (mode === 'drop-before-end') {
    behaviour.counters.dropped += 1;
    stream.resume();
    socket?.destroy();
    return null;
  }
  const raw = await buffer(stream);
  if (mode === 'hang') return null;
  if (mode === 'refuse') {
    behaviour.counters.refused += 1;
    return { error: Object.assign(new Error('Try again later'), { responseCode: 451 }) };
  }
  if (mode === 'slow' && !(await dribble(socket))) return null;
  await store.add(envelopeOf(session), raw);
  behaviour.counters.accepted += 1;
  if (mode === 'drop-after-end') {
    behaviour.counters.dropped += 1;
    socket?.destroy();
    return null;
  }
  return { error: null };
}

/** Sends continuation lines for a minute; false when the sender left before the end. */
function dribble(socket: Socket | undefined): Promise<boolean> {
  return new Promise((resolve) => {
    let lines = 0;
    const end = (stayed: boolean) => {
      clearInterval(timer);
      socket?.off('close', left);
      resolve(stayed);
    };
    const left = () => end(false);
    const timer = setInterval(() => {
      if (!socket || socket.destroyed) return end(false);
      if (++lines > SLOW_LINES) return end(true);
      socket.write('250-still at it\r\n');
    }, SLOW_LINE_MS);
    socket?.once('close', left);
  });
}

function envelopeOf(session: SMTPServerSession): Envelope {
  const { mailFrom, rcptTo } = session.envelope;
  return { from: mailFrom ? mailFrom.address : '', to: rcptTo.map((receiver) => receiver.address) };
}
