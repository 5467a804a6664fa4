import { smtpStages, type SmtpFault, type SmtpStage } from '@wetside/mail-catcher';
import { TestApp } from '../../testing/test-app.js';
import { MailCase } from './sender.fixture.js';

interface Fault {
  what: string;
  /** null: the mail server is away. */
  fault: SmtpFault | null;
  /** What the row says of the first try. */
  answer: RegExp;
}

const DEADLINE_S = 3;
const BACKOFF_S = 30;

const asked: readonly SmtpStage[] = smtpStages.filter((stage) => stage !== 'mail');
const at = (stage: SmtpStage): string =>
  stage === 'end' ? 'after the whole mail' : stage === 'mail' ? 'in the middle of the mail' : `at ${stage}`;
const TOO_LONG = /^The mail server took longer than 3 s\.$/;

const faults: Fault[] = [
  { what: 'the connection is refused', fault: null, answer: /ECONNREFUSED/ },
  ...[451, 554].flatMap((code) =>
    asked.map((stage): Fault => ({
      what: `${code} ${at(stage)}`,
      fault: { stage, how: 'answer', code },
      answer: new RegExp(String(code)),
    })),
  ),
  ...asked.map((stage): Fault => ({
    what: `no answer ${at(stage)}`,
    fault: { stage, how: 'hang' },
    answer: TOO_LONG,
  })),
  ...asked.map((stage): Fault => ({
    what: `an answer that drips ${at(stage)}`,
    fault: { stage, how: 'drip' },
    answer: TOO_LONG,
  })),
  ...smtpStages.map((stage): Fault => ({
    what: `the connection is cut ${at(stage)}`,
    fault: { stage, how: 'cut' },
    answer: /closed|reset|ECONN|EPIPE|disconnected/i,
  })),
];

/** How often the mail may arrive by the first try, and how often that is counted as of unclear end. */
function expected({ fault }: Fault): { early: number; counted: readonly number[] } {
  if (fault?.stage === 'end' && fault.how !== 'answer') return { early: 1, counted: [1] };
  // Whether the last line had left this side is not known to the other: it is counted when it had.
  if (fault?.stage === 'mail') return { early: 0, counted: [0, 1] };
  return { early: 0, counted: [0] };
}

describe('a mail server that fails', () => {
  let world: TestApp;
  const played = new Map<
    string,
    { first: Awaited<ReturnType<MailCase['row']>>; mail: MailCase; tookS: number }
  >();

  /** All of them at once: each has a mail, a mail server and a sender of its own. */
  beforeAll(async () => {
    const quiet = { background: false };
    world = await TestApp.start({ MAIL_BACKOFF_S: String(BACKOFF_S) }, [], quiet);
    const darkroomId = await world.darkroom('cellar', await world.person('Ada'));
    await Promise.all(faults.map((fault) => play(fault, darkroomId)));
    world.clock.advance((BACKOFF_S + 1) * 1_000);
    await Promise.all(faults.map(async ({ what }) => of(what).mail.run(of(what).mail.sender())));
  }, 120_000);
  afterAll(async () => {
    await Promise.all([...played.values()].map(({ mail }) => mail.smtp.close()));
    await world.close();
  });

  async function play({ what, fault }: Fault, darkroomId: string): Promise<void> {
    const mail = await MailCase.post(world, darkroomId, { deadlineS: DEADLINE_S });
    const away = fault ? null : await mail.goAway();
    mail.smtp.setFault(fault);
    const before = performance.now();
    await mail.run(mail.sender());
    const tookS = (performance.now() - before) / 1_000;
    played.set(what, { first: await mail.row(), mail, tookS });
    await away?.back();
    mail.smtp.setFault(null);
  }

  function of(what: string) {
    const found = played.get(what);
    if (!found) throw new Error(`${what} was not played`);
    return found;
  }

  it.each(
    faults.map((one) => {
      const { early, counted } = expected(one);
      return { ...one, early, counted, times: early + 1, tally: counted.join(' or ') };
    }),
  )('fault: $what; tries 2, arrives $times, unclear $tally', async ({ what, answer, times, counted }) => {
    const { first, mail, tookS } = of(what);
    expect(first).toMatchObject({ state: 'waiting', attempts: 1 });
    expect(counted).toContain(first.unclearTries);
    expect(first.lastAnswer).toMatch(answer);
    // It may end before the deadline, never long after it, however slowly something still came.
    expect(tookS).toBeLessThan(DEADLINE_S + 8);
    const last = await mail.row();
    expect(last).toMatchObject({ state: 'sent', attempts: 2, unclearTries: first.unclearTries });
    expect(mail.arrivedIds()).toEqual(Array(times).fill(last.messageId));
  });
});
