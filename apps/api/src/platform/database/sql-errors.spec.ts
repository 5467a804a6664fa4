import { databaseTrouble, isAboutConnection, isConnectionLost } from './sql-errors.js';
import { OutOfTime } from './within.js';

const withCode = (code: string) => Object.assign(new Error('failed'), { code });

describe('an error of the database', () => {
  // SQLSTATE: PostgreSQL's manual, appendix A. CONNECT…: postgres.js, README, "Errors". E…: Node's manual, errno.
  it.each([
    ['55P03', 'held-up'],
    ['40P01', 'held-up'],
    ['40001', 'held-up'],
    ['57014', 'too-slow'],
    ['25P03', 'too-slow'],
    ['57P01', 'unavailable'],
    ['57P02', 'unavailable'],
    ['57P03', 'unavailable'],
    ['53300', 'unavailable'],
    ['53100', 'unavailable'],
    ['08006', 'unavailable'],
    ['ECONNREFUSED', 'unavailable'],
    ['CONNECT_TIMEOUT', 'unavailable'],
    ['CONNECTION_CLOSED', 'interrupted'],
    ['CONNECTION_DESTROYED', 'interrupted'],
    ['ECONNRESET', 'interrupted'],
    ['EPIPE', 'interrupted'],
    ['23505', null],
    ['42501', null],
    ['ENOENT', null],
  ])('%s is %s, however deep it is wrapped', (code, trouble) => {
    expect(databaseTrouble(withCode(code))).toBe(trouble);
    const wrapped = new Error('query failed', { cause: new Error('again', { cause: withCode(code) }) });
    expect(databaseTrouble(wrapped)).toBe(trouble);
  });

  it('that ran out of time is about its connection, which may say nothing ever again', () => {
    const late = new OutOfTime('late');
    expect([databaseTrouble(late), isAboutConnection(late), isConnectionLost(late)]).toEqual([
      'too-slow',
      true,
      false,
    ]);
  });

  it.each([null, undefined, 'text', 7, {}])('is not made of %p', (thing) => {
    expect(databaseTrouble(thing)).toBeNull();
  });
});
