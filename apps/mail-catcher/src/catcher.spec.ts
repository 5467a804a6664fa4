import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import { startMailCatcher, type MailCatcher } from './index.js';

let catcher: MailCatcher;

beforeEach(async () => {
  catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0 });
});
afterEach(() => catcher.close());

const send = (subject: string, limits: { socketTimeout?: number } = {}) =>
  createTransport({ host: '127.0.0.1', port: catcher.smtpPort, ...limits }).sendMail({
    from: 'Wetside <wetside@darkroom.example>',
    to: 'ines@darkroom.example',
    subject,
    text: 'The fixer is spent.\nhttp://localhost:3000/d/quay/sink <b>',
    messageId: '<one@darkroom.example>',
    headers: { 'Auto-Submitted': 'auto-generated' },
  });

const ask = (path: string, init?: RequestInit) => fetch(`http://127.0.0.1:${catcher.httpPort}${path}`, init);

const behave = (order: object) => ask('/behaviour', { method: 'POST', body: JSON.stringify(order) });

describe('the mail catcher', () => {
  it('keeps what came over the socket', async () => {
    await send('Spent: FX 12 · é');
    const [mail] = catcher.messages();
    expect(mail).toMatchObject({
      n: 1,
      subject: 'Spent: FX 12 · é',
      to: ['ines@darkroom.example'],
      messageId: '<one@darkroom.example>',
      headers: { 'auto-submitted': 'auto-generated' },
    });
    expect(mail?.text).toContain('The fixer is spent.');
    expect(mail?.source).toContain('Message-ID: <one@darkroom.example>');
  });

  it('lists by receiver and subject, shows one, and empties', async () => {
    await send('First');
    await send('Second');
    expect(await (await ask('/messages?subject=second')).json()).toHaveLength(1);
    expect(await (await ask('/messages?to=ines')).json()).toHaveLength(2);
    expect(await (await ask('/messages?to=nobody')).json()).toHaveLength(0);
    expect(await (await ask('/messages/2')).json()).toMatchObject({ subject: 'Second' });
    expect((await ask('/messages/3')).status).toBe(404);
    await ask('/messages', { method: 'DELETE' });
    expect(catcher.messages()).toHaveLength(0);
  });

  it('shows the newest first on a page where a mail is only text', async () => {
    await send('First');
    await send('<script>Second');
    const page = await (await ask('/')).text();
    expect(page.indexOf('Second')).toBeLessThan(page.indexOf('First'));
    expect(page).not.toContain('<script>');
    expect(page).toContain('<a href="http://localhost:3000/d/quay/sink"');
    expect(page).toContain('&lt;b&gt;');
  });

  it('refuses with 451 as many times as it was told', async () => {
    await behave({ mode: 'refuse', times: 1 });
    await expect(send('Refused')).rejects.toMatchObject({ responseCode: 451 });
    await send('Taken');
    expect(catcher.messages().map((mail) => mail.subject)).toEqual(['Taken']);
    expect(await (await ask('/behaviour')).json()).toMatchObject({
      mode: 'accept',
      connections: 2,
      accepted: 1,
      refused: 1,
    });
  });

  it('cuts the connection before the end of a mail and keeps nothing', async () => {
    catcher.setBehaviour({ mode: 'drop-before-end', times: 1 });
    await expect(send('Lost')).rejects.toThrow();
    expect(catcher.messages()).toHaveLength(0);
  });

  it('cuts the connection after the end of a mail and keeps it, unsaid', async () => {
    catcher.setBehaviour({ mode: 'drop-after-end', times: 1 });
    await expect(send('Kept')).rejects.toThrow();
    expect(catcher.messages().map((mail) => mail.subject)).toEqual(['Kept']);
  });

  it('leaves a sender without an answer', async () => {
    catcher.setBehaviour({ mode: 'hang' });
    await expect(send('Unanswered', { socketTimeout: 200 })).rejects.toMatchObject({ code: 'ETIMEDOUT' });
    expect(catcher.behaviour()).toMatchObject({ mode: 'hang', timesLeft: null, accepted: 0 });
  });

  it('answers slowly, line by line, so that a limit on silence alone does not end it', async () => {
    catcher.setBehaviour({ mode: 'slow' });
    const socket = connect(catcher.smtpPort, '127.0.0.1');
    const say = [
      'HELO here',
      'MAIL FROM:<a@darkroom.example>',
      'RCPT TO:<b@darkroom.example>',
      'DATA',
      'Subject: Slow\r\n\r\nSlow.\r\n.',
    ];
    let heard = '';
    for await (const chunk of socket) {
      heard += String(chunk);
      const next = say.shift();
      if (next) socket.write(`${next}\r\n`);
      if (heard.endsWith('250-still at it\r\n'.repeat(3))) break;
    }
    expect(heard).toMatch(/(250-still at it\r\n){3}$/);
    expect(catcher.messages()).toHaveLength(0);
  });

  it('says what is wrong with an order, and turns strangers away', async () => {
    expect((await behave({ mode: 'explode' })).status).toBe(400);
    expect((await behave({ mode: 'refuse', times: 0 })).status).toBe(400);
    expect(
      (await ask('/messages', { headers: { 'sec-fetch-site': 'cross-site' }, method: 'DELETE' })).status,
    ).toBe(403);
  });
});

describe('a catcher with a folder', () => {
  it('finds its mails again', async () => {
    const mailDir = await mkdtemp(join(tmpdir(), 'mail-catcher-'));
    const first = await startMailCatcher({ smtpPort: 0, httpPort: 0, mailDir });
    await createTransport({ host: '127.0.0.1', port: first.smtpPort }).sendMail({
      from: 'wetside@darkroom.example',
      to: 'ines@darkroom.example',
      subject: 'Kept',
      text: 'On disk.',
    });
    await first.close();
    const second = await startMailCatcher({ smtpPort: 0, httpPort: 0, mailDir });
    expect(second.messages()).toMatchObject([{ n: 1, subject: 'Kept', text: 'On disk.\n' }]);
    await second.clear();
    expect(await readdir(mailDir)).toEqual([]);
    await second.close();
    await rm(mailDir, { recursive: true });
  });
});
