export const PASSPHRASE_MIN = 15;
export const PASSPHRASE_MAX = 128;

/** Long, and still among the first that anybody tries. Compared without spaces, case and punctuation. */
const COMMON = new Set([
  'correcthorsebatterystaple',
  'letmeinletmeinletmein',
  'passwordpassword',
  'passwordpassword1',
  'password12345678',
  'password123456789',
  'passphrasepassphrase',
  'thisismypassword',
  'thisismypassphrase',
  'mypasswordispassword',
  'qwertyuiopasdfgh',
  'qwertyuiopasdfghjkl',
  'qwertyuiopasdfghjklzxcvbnm',
  'qwertyuiop123456',
  '1qaz2wsx3edc4rfv',
  '1q2w3e4r5t6y7u8i9o0p',
  'abcdefghijklmno',
  'abcdefghijklmnopqrstuvwxyz',
  'iloveyouiloveyou',
  'administrator123',
  'welcometothedarkroom',
]);

/**
 * What is wrong with a new passphrase, as a sentence, or null. Length is all that is asked for;
 * beyond that only what would be guessed at once is refused: a known one, a repeated piece, a run of digits, one's own address.
 */
export function passphraseComplaint(passphrase: string, email: string): string | null {
  const length = [...passphrase].length;
  if (length < PASSPHRASE_MIN)
    return `Use at least ${PASSPHRASE_MIN} characters; a few words make a good passphrase.`;
  if (length > PASSPHRASE_MAX) return `Use at most ${PASSPHRASE_MAX} characters.`;
  const plain = passphrase.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');
  if (COMMON.has(plain) || isRun(plain))
    return 'That one is tried first by everybody who guesses; choose another.';
  if (/^(.{1,8}?)\1+$/u.test(passphrase)) return 'That is one piece repeated; choose another.';
  if (passphrase.trim().toLowerCase() === email.trim().toLowerCase())
    return 'That is your address; choose another.';
  return null;
}

/** 1234567890123456 and its like: each digit one more (or one less) than the one before. */
function isRun(plain: string): boolean {
  if (!/^\d+$/.test(plain)) return false;
  const steps = [...plain].slice(1).map((digit, i) => (Number(digit) - Number(plain[i]) + 10) % 10);
  return steps.every((step) => step === steps[0]);
}
