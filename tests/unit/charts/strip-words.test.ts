import { describe, expect, it } from 'vitest';
import { stripWords } from '@/app/_charts/strip-words';

describe('stripWords', () => {
  it('says how many levels, where the newest stands and how many are signals', () => {
    expect(stripWords([{ z: 3.24, signal: true }])).toBe(
      '1 level; the newest 3.2 σ above the centre line; 1 signal',
    );
    expect(
      stripWords([
        { z: 0, signal: false },
        { z: -1.06, signal: false },
      ]),
    ).toBe('2 levels; the newest 1.1 σ below the centre line; no signals');
  });

  it('says so when there are none', () => {
    expect(stripWords([])).toBe('No levels yet');
    expect(stripWords([{ z: null, signal: false }])).toBe('No levels yet');
  });

  it('passes over levels that were excluded', () => {
    expect(
      stripWords([
        { z: 1, signal: false },
        { z: 8, signal: true, excluded: true },
      ]),
    ).toBe('1 level; the newest 1.0 σ above the centre line; no signals');
  });
});
