import { describe, expect, it } from 'vitest';
import { givenWords, wordsQuery } from '@/lib/maps/schema';

describe('givenWords', () => {
  it('passes on what was said and leaves out what was not', () => {
    const given = givenWords({ stream: ' n-epi ', wafer: 'W-1', lot: '', strange: 'x' }, 'UTC');
    expect(given).toEqual({
      typed: { stream: 'n-epi', wafer: 'W-1' },
      words: { stream: 'n-epi', wafer: 'W-1' },
      errors: {},
    });
  });

  it('reads a clock time in the zone of the site and keeps a time with an offset as it is', () => {
    const words = (measured: string) =>
      givenWords({ measured_at: measured }, 'Europe/Berlin').words.measured_at;
    expect(words('2026-02-01T10:00')).toBe('2026-02-01T09:00:00.000Z');
    expect(words('2026-02-01T10:00:00-05:00')).toBe('2026-02-01T10:00:00-05:00');
  });

  it('says beside the field what is wrong with it', () => {
    const { errors } = givenWords({ temperature_c: 'hot', measured_at: 'noon', ingot_fraction: '1' }, 'UTC');
    expect(Object.keys(errors).sort()).toEqual(['ingot_fraction', 'measured_at', 'temperature_c']);
    expect(errors.temperature_c).toContain('"hot"');
  });

  it('takes the first of a name that stands twice in the address', () => {
    expect(givenWords({ lot: ['A', 'B'] }, 'UTC').words.lot).toBe('A');
  });

  it('comes back from the address as it was typed', () => {
    const { typed } = givenWords({ stream: 'a&b=c', note: 'ä +1 %' }, 'UTC');
    expect(givenWords(Object.fromEntries(new URLSearchParams(wordsQuery(typed))), 'UTC').typed).toEqual(
      typed,
    );
  });
});
