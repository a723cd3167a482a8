import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COMMON_WORDS } from '@/server/auth/commonPasswords';
import { passwordFault } from '@/server/auth/passwordStrength';

const OWNER = { email: 'petra.vale@tarnhollow.example', name: 'Petra Vale' };
const fault = (password: string): string | null => passwordFault(password, OWNER);

describe('a new password', () => {
  it.each([
    'password1234',
    'P@ssw0rd!2024',
    'Welcome2Steadmain!',
    'footballmanager1',
    'iloveyou1234',
    'summer2026!!',
    'qwertyuiop12',
    'zaq12wsxcde3',
    '123456789012',
    '098765432109',
    'abcdefghijklmnop',
    'aaaaaaaaaaaa',
    'abcabcabcabc',
    'petravale2026',
    'Vale-Petra-2026',
    'Tarnhollow-2026',
    'petra.vale@tarnhollow.example',
    'elevenchars',
    '            ',
  ])('is not %j', (password) => expect(fault(password)).toEqual(expect.any(String)));

  it.each([
    'steam-before-noon',
    'four kettles and a filler',
    'correct horse battery',
    'x9!kq2LmPz0w',
    'Tr0ub4dor&3xyz',
    'пароль из четырёх слов',
    '四個詞不屬於一起的密碼真好',
    'blue sky over two mills',
  ])('may be %j', (password) => expect(fault(password)).toBeNull());

  it('is refused where it is a common word with digits around it, whatever the case', () => {
    const words = [...COMMON_WORDS].filter((word) => word.length >= 4);
    const digits = fc.stringMatching(/^\d{0,12}$/);
    let cases = 0;
    fc.assert(
      fc.property(fc.constantFrom(...words), digits, digits, fc.boolean(), (word, before, after, isUpper) => {
        const password = `${before}${isUpper ? word.toUpperCase() : word}${after}`;
        fc.pre(password.length >= 12);
        cases++;
        expect(fault(password)).not.toBeNull();
      }),
      { numRuns: 2_000 },
    );
    expect(cases).toBe(2_000);
  });

  it('is accepted where it is twelve random signs or more', () => {
    let cases = 0;
    const signs = fc.string({
      unit: fc.constantFrom(...'bcdfghjkmnpqrstvwxz23456789#%&*+?'),
      minLength: 14,
      maxLength: 60,
    });
    fc.assert(
      fc.property(signs, (password) => {
        // Chance alone repeats signs now and then, at length fourteen hardly ever to a single one.
        fc.pre(new Set(password).size >= 9 && /[a-z].*[a-z].*[a-z].*[a-z]/.test(password));
        cases++;
        expect(fault(password)).toBeNull();
      }),
      { numRuns: 500 },
    );
    expect(cases).toBe(500);
  });

  it('of the greatest length is judged without delay', () => {
    const long = ['qwerty'.repeat(33), 'a'.repeat(199) + 'b', 'ab'.repeat(100), 'passwordlove'.repeat(16)];
    expect(long.map(fault).every((one) => one === null || one.length > 0)).toBe(true);
  });
});
