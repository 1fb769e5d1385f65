import { describe, expect, test } from 'vitest';
import { passwordFault } from '@/lib/access/password-fault';

describe('a password', () => {
  test.each(['short', 'elevenchars'])('of fewer than twelve characters is refused: %s', (password) => {
    expect(passwordFault(password, [])).toMatch(/At least 12/);
  });

  test('of more than 128 characters is refused, of 128 taken', () => {
    const long = 'copper kettle '.repeat(9) + 'ox';
    expect(long).toHaveLength(128);
    expect(passwordFault(long, [])).toBeNull();
    expect(passwordFault(`${long}!`, [])).toMatch(/At most 128/);
  });

  test.each([
    ['the list itself', 'qwertyuiop[]'],
    ['a common one with figures behind it', 'Password1234'],
    ['a common one between signs', '!!!password!!!'],
    ['a common one said twice', 'dragondragon'],
    ['figures alone', '314159265358'],
    ['one letter over and over', 'aaaaaaaaaaaaaa'],
  ])('that is common is refused: %s', (_kind, password) => {
    expect(passwordFault(password, [])).toMatch(/tried first/);
  });

  test.each(['rosa.lindqvist', 'Rosa Lindqvist', 'rosa.lindqvist@plant.example', 'RosaLindqvist2026'])(
    'that is the person’s own name or address is refused: %s',
    (password) => {
      expect(passwordFault(password, ['Rosa Lindqvist', 'rosa.lindqvist@plant.example'])).toMatch(/your own/);
    },
  );

  test('of several words, or in any script, is taken', () => {
    expect(passwordFault('four copper kettles', ['Rosa Lindqvist'])).toBeNull();
    expect(passwordFault('красный чайник поёт', [])).toBeNull();
    expect(passwordFault('q8$Rk2!vLm0z', [])).toBeNull();
  });
});
