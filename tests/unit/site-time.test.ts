import { describe, expect, it } from 'vitest';
import { siteInstant, siteTimeField } from '@/lib/site-time';

describe('siteInstant', () => {
  it('reads a clock time in the zone it is meant in, summer and winter', () => {
    expect(siteInstant('2031-07-05T06:07', 'Europe/Berlin')?.toISOString()).toBe('2031-07-05T04:07:00.000Z');
    expect(siteInstant('2031-01-05 06:07:08', 'Europe/Berlin')?.toISOString()).toBe(
      '2031-01-05T05:07:08.000Z',
    );
    expect(siteInstant('2031-01-05T06:07', 'Asia/Kathmandu')?.toISOString()).toBe('2031-01-05T00:22:00.000Z');
    expect(siteInstant('2031-01-05T06:07', 'UTC')?.toISOString()).toBe('2031-01-05T06:07:00.000Z');
  });

  it('takes the earlier of two instants where the clock is set back, and goes on where it skips', () => {
    // Europe/Berlin, 2025-10-26: 03:00 +02:00 becomes 02:00 +01:00; 2025-03-30: 02:00 becomes 03:00 (IANA tz database).
    expect(siteInstant('2025-10-26T02:30', 'Europe/Berlin')?.toISOString()).toBe('2025-10-26T00:30:00.000Z');
    expect(siteInstant('2025-03-30T02:30', 'Europe/Berlin')?.toISOString()).toBe('2025-03-30T01:30:00.000Z');
  });

  it('answers null to what is no time of day', () => {
    for (const words of [
      '',
      'noon',
      '2031-02-30T10:00',
      '2031-01-05T24:00',
      '2031-01-05',
      '2031-01-05T06:07Z',
    ]) {
      expect(siteInstant(words, 'UTC')).toBeNull();
    }
  });

  it('comes back from a time field as it went in', () => {
    const moment = new Date('2031-07-05T04:07:00Z');
    for (const zone of ['UTC', 'Europe/Berlin', 'America/St_Johns', 'Pacific/Apia']) {
      expect(siteInstant(siteTimeField(moment, zone), zone)).toEqual(moment);
    }
  });
});
