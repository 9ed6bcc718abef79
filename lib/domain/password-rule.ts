/** The shortest password taken, in characters. */
export const PASSWORD_MIN_LENGTH = 12;
/** The longest, so that nobody makes the server hash a book. */
export const PASSWORD_MAX_LENGTH = 200;

/** The commonest passwords that are long enough to pass otherwise. Compared without case, blanks and signs. */
const COMMONEST = new Set([
  '123456789012',
  '1234567890123',
  '12345678901234',
  '123456789123',
  '1234567890abc',
  '123123123123',
  '123456123456',
  '098765432109',
  '1q2w3e4r5t6y',
  '1qaz2wsx3edc',
  '1qazxsw23edc',
  'abc123abc123',
  'abcd12345678',
  'abcdefghijkl',
  'administrator',
  'adminadminadmin',
  'changemechangeme',
  'changeme1234',
  'correcthorsebatterystaple',
  'iloveyou1234',
  'iloveyouiloveyou',
  'letmein12345',
  'letmeinletmein',
  'password1234',
  'password12345',
  'password123456',
  'passwordpassword',
  'qazwsxedcrfv',
  'qwerty123456',
  'qwertyqwerty',
  'qwertyuiop12',
  'qwertyuiop123',
  'qwertyuiopasdf',
  'welcome12345',
  'welcomewelcome',
  'wakewrightwakewright',
]);

/**
 * What is wrong with a new password, or null. Length ≥ 12 and ≤ 200, not the person's e-mail, not one of the
 * commonest, not one character over and over. No rule about kinds of characters (NIST SP 800-63B, 5.1.1.2).
 */
export function checkPassword(password: string, email: string): string | null {
  if ([...password].length < PASSWORD_MIN_LENGTH) return `needs at least ${PASSWORD_MIN_LENGTH} characters`;
  if (password.length > PASSWORD_MAX_LENGTH) return `is longer than ${PASSWORD_MAX_LENGTH} characters`;
  if (password.trim().toLowerCase() === email.trim().toLowerCase()) return 'is the e-mail address itself';
  const bare = password.toLowerCase().replace(/[^a-z0-9]/g, '');
  if (COMMONEST.has(bare)) return 'is one of the commonest passwords';
  if (new Set(password).size === 1) return 'is one character over and over';
  return null;
}
