import { describe, expect, it } from 'vitest';
import { shiftWords } from '@/app/(line)/setup/shift-words';

describe('the words for a shift of the charted value', () => {
  it('name its size and side, the span where wafers differ, and nothing where nothing moves', () => {
    expect(shiftWords({ least: -2.3, most: -2.3 })).toMatch(/^would read 2\.30\s% lower$/);
    expect(shiftWords({ least: 1.2, most: 1.22 })).toMatch(/^would read 1\.21\s% higher$/);
    expect(shiftWords({ least: -0.003, most: 0.004 })).toBe('would read as before');
    expect(shiftWords({ least: -1.2, most: 0.3 })).toMatch(
      /^would read differently, by −1\.20\s% to \+0\.30\s%$/,
    );
  });
});
