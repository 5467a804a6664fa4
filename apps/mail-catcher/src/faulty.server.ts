import { createServer, type AddressInfo, type Socket } from 'node:net';
import { once } from 'node:events';

/** Where in a conversation the server stands. `mail`: it has read a part of the mail; `end`: all of it. */
export const smtpStages = ['greeting', 'EHLO', 'MAIL FROM', 'RCPT TO', 'DATA', 'mail', 'end'] as const;
export type SmtpStage = (typeof smtpStages)[number];

/**
 * What goes wrong at a stage: an answer of refusal, no answer, a byte now and then that never makes a whole answer, a
 * connection that is cut instead of an answer.
 */
export type SmtpFault = { stage: SmtpStage } & (
  { how: 'answer'; code: number } | { how: 'hang' | 'drip' | 'cut' }
);

/** An SMTP server that speaks by hand, so that it can go wrong anywhere. */
export interface FaultySmtp {
  port: number;
  /** Mails that were read to their end and not refused, oldest first, whether or not the sender learnt of it. */
  arrived(): string[];
  /** From now on; null: none. */
  setFault(fault: SmtpFault | null): void;
  /** Resolves once so many conversations hang; at once where they do already. */
  standing(count?: number): Promise<void>;
  /** Gives every conversation that hangs the answer that it waits for, or cuts it. */
  release(how?: 'answer' | 'cut'): void;
  /** Cuts what is open and frees the port. */
  close(): Promise<void>;
}

const DRIP_MS = 50;
const answers: Record<SmtpStage, string> = {
  greeting: '220 a hand-made mail server',
  EHLO: '250 at your service',
  'MAIL FROM': '250 from whom',
  'RCPT TO': '250 to whom',
  DATA: '354 go on',
  mail: '',
  end: '250 taken',
};
const END = '\r\n.\r\n';

/** Listens on loopback; port 0 takes any free one. */
export async function startFaultySmtp(port = 0): Promise<FaultySmtp> {
  const state = new State();
  const sockets = new Set<Socket>();
  const server = createServer((socket) => {
    sockets.add(socket);
    socket.on('error', () => undefined).on('close', () => sockets.delete(socket));
    converse(socket, state);
  }).listen(port, '127.0.0.1');
  await once(server, 'listening');
  return {
    port: (server.address() as AddressInfo).port,
    arrived: () => [...state.mails],
    setFault: (fault) => (state.fault = fault),
    standing: (count = 1) => state.standing(count),
    release: (how = 'answer') => state.release(how),
    close: async () => {
      const closed = once(server, 'close');
      server.close();
      for (const socket of sockets) socket.destroy();
      await closed;
    },
  };
}

class State {
  fault: SmtpFault | null = null;
  readonly mails: string[] = [];
  private hanging: Record<'answer' | 'cut', () => void>[] = [];
  private waiting: { count: number; resolve: () => void }[] = [];

  hang(ends: Record<'answer' | 'cut', () => void>): void {
    this.hanging.push(ends);
    const reached = ({ count }: { count: number }) => count <= this.hanging.length;
    for (const { resolve } of this.waiting.filter(reached)) resolve();
    this.waiting = this.waiting.filter((one) => !reached(one));
  }

  standing(count: number): Promise<void> {
    if (count <= this.hanging.length) return Promise.resolve();
    return new Promise((resolve) => this.waiting.push({ count, resolve }));
  }

  release(how: 'answer' | 'cut'): void {
    for (const ends of this.hanging.splice(0)) ends[how]();
  }
}

function converse(socket: Socket, state: State): void {
  let text = '';
  let inMail = false;
  const reach = (stage: SmtpStage): void => {
    answer(socket, state, stage);
    if (stage === 'DATA') inMail = true;
  };
  socket.setEncoding('latin1').on('data', (chunk: string) => {
    text += chunk;
    if (inMail && state.fault?.stage === 'mail') return reach('mail');
    const end = inMail ? text.indexOf(END) : text.indexOf('\r\n');
    if (end < 0) return;
    const said = text.slice(0, end);
    text = text.slice(end + (inMail ? END.length : 2));
    if (inMail) {
      inMail = false;
      if (state.fault?.stage !== 'end' || state.fault.how !== 'answer') state.mails.push(said);
      return reach('end');
    }
    // Who does not get on with EHLO tries the older HELO.
    const words = said.toUpperCase().replace(/^HELO/, 'EHLO');
    const stage = smtpStages.find((one) => words.startsWith(one));
    if (stage) reach(stage);
    else socket.end('221 bye\r\n');
  });
  reach('greeting');
}

function answer(socket: Socket, state: State, stage: SmtpStage): void {
  const { fault } = state;
  const usual = () => socket.write(`${answers[stage]}\r\n`);
  if (fault?.stage !== stage) usual();
  else if (fault.how === 'answer') socket.write(`${fault.code} not today\r\n`);
  else if (fault.how === 'cut') socket.destroy();
  else if (fault.how === 'hang') state.hang({ answer: usual, cut: () => socket.destroy() });
  else drip(socket, answers[stage].slice(0, 4));
}

/** The code, and then words without an end. */
function drip(socket: Socket, code: string): void {
  socket.write(code);
  const timer = setInterval(() => socket.write('.'), DRIP_MS);
  socket.once('close', () => clearInterval(timer));
}
