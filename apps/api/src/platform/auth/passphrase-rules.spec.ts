import { passphraseComplaint } from './passphrase-rules.js';

const complaint = (passphrase: string) => passphraseComplaint(passphrase, 'ada@example.org');

describe('a new passphrase', () => {
  it.each(['four quiet trays by the sink', 'x7!k2 Ω pässwörd ok', 'f'.repeat(64) + 'another sixty-four'])(
    'may be %p',
    (passphrase) => {
      expect(complaint(passphrase)).toBeNull();
    },
  );

  it('has 15 to 128 characters, counted as people count them', () => {
    expect(complaint('only 14 signs.')).toContain('15');
    expect(complaint('🎞️🎞️🎞️🎞️🎞️')).toContain('15');
    expect(complaint(`${'not so short '.repeat(9)}and one more..`)).toContain('128');
  });

  it.each([
    'Password Password 1',
    'correct horse battery staple',
    '1234567890123456',
    '9876543210987654',
    'ababababababababab',
    'aaaaaaaaaaaaaaaa',
  ])('is not one that is guessed at once: %p', (passphrase) => {
    expect(complaint(passphrase)).not.toBeNull();
  });

  it('is not the address it opens', () => {
    expect(passphraseComplaint('Ada@Example.org', 'ada@example.org')).toContain('address');
  });
});
