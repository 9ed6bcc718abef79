import { describe, expect, test } from 'vitest';
import { checkPassword } from '@/lib/domain/password-rule';

const email = 'Ada.Fairlead@wakewright.example';

describe('which passwords are taken', () => {
  test.each([
    'three-docks-afloat',
    'aaaabbbbcccc',
    'p a s s e s  12',
    'ñandú y ñu al sol',
    '7'.repeat(11) + '8',
  ])('taken, whatever kinds of characters it has: %s', (password) => {
    expect(checkPassword(password, email)).toBeNull();
  });

  test('eleven characters are too few, twelve are enough', () => {
    expect(checkPassword('elevenchars', email)).toBe('needs at least 12 characters');
    expect(checkPassword('twelve chars', email)).toBeNull();
  });

  test('characters are counted as people count them', () => {
    expect(checkPassword('🛥️'.repeat(5), email)).toBe('needs at least 12 characters');
  });

  test('two hundred characters are taken, one more is not', () => {
    expect(checkPassword('ab'.repeat(100), email)).toBeNull();
    expect(checkPassword('ab'.repeat(100) + 'a', email)).toBe('is longer than 200 characters');
  });

  test('the e-mail address itself is refused in any case', () => {
    expect(checkPassword('ada.fairlead@WAKEWRIGHT.example', email)).toBe('is the e-mail address itself');
  });

  test.each(['PasswordPassword', 'qwerty-123456', '1234 5678 9012', 'letmein!letmein!'])(
    'one of the commonest is refused however it is dressed up: %s',
    (password) => {
      expect(checkPassword(password, email)).toBe('is one of the commonest passwords');
    },
  );

  test('one character over and over is refused', () => {
    expect(checkPassword('zzzzzzzzzzzzzz', email)).toBe('is one character over and over');
  });
});
