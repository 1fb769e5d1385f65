import { describe, expect, it } from 'vitest';
import { standsIn } from '@/app/_ui/stands-in';

describe('standsIn', () => {
  const board = { href: '/', label: 'Board', covers: ['/streams'] };
  const setup = { href: '/setup', label: 'Setup' };

  it('is the page itself at its own address', () => {
    expect(standsIn('/', board)).toBe('page');
    expect(standsIn('/setup', setup)).toBe('page');
  });

  it('holds the pages below it and those it covers', () => {
    expect(standsIn('/setup/targets', setup)).toBe(true);
    expect(standsIn('/streams/7', board)).toBe(true);
  });

  it('does not hold an address that merely begins alike, and the home place does not hold the whole site', () => {
    expect(standsIn('/setups', setup)).toBe(false);
    expect(standsIn('/intake', board)).toBe(false);
  });
});
