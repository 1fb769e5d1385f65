import { describe, expect, it } from 'vitest';
import {
  formatAge,
  formatDate,
  formatDateTime,
  formatDensity,
  formatDensityPerCm3,
  formatNumber,
  formatPercent,
  formatResistivity,
  formatSheetResistance,
  formatSignedPercent,
  formatWithUncertainty,
  shortDay,
} from '@/lib/format';

/** Unbreakable spaces read as plain ones here. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('formatNumber', () => {
  it('keeps trailing zeros, which say how far the number is known', () => {
    expect(formatNumber(10.0449, 4)).toBe('10.04');
    expect(formatNumber(10, 4)).toBe('10.00');
    expect(formatNumber(0.00123456, 3)).toBe('0.00123');
    expect(formatNumber(123456, 3)).toBe('123000');
  });
  it('counts digits after rounding, not before', () => {
    expect(formatNumber(9.9996, 4)).toBe('10.00');
    expect(formatNumber(0.09999, 3)).toBe('0.100');
  });
  it('prints a true minus sign, a bare zero and a dash for what is not defined', () => {
    expect(formatNumber(-2.5, 2)).toBe('\u22122.5');
    expect(formatNumber(0)).toBe('0');
    expect(formatNumber(null)).toBe('—');
    expect(formatNumber(Number.NaN)).toBe('—');
  });
});

describe('formatWithUncertainty', () => {
  // GUM, JCGM 100:2008 §7.2.6: "y = 10,057 62 Ω with u = 27 mΩ" is rounded to "10,058 Ω".
  it('rounds the value of the GUM example to the place of its uncertainty', () => {
    expect(plain(formatWithUncertainty(10.05762, 0.027, 'Ω'))).toBe('10.058 ± 0.027 Ω');
  });
  it('keeps the place of the uncertainty when it is larger than ten', () => {
    expect(formatWithUncertainty(12345, 678)).toBe('12350 ± 680');
    expect(formatWithUncertainty(12345, 12)).toBe('12345 ± 12');
  });
  it('counts the digits of the uncertainty after rounding it', () => {
    expect(formatWithUncertainty(1.23456, 0.0999)).toBe('1.23 ± 0.10');
  });
  it('falls back on the plain number where there is no uncertainty', () => {
    expect(plain(formatWithUncertainty(10.0449, null, 'Ω·cm'))).toBe('10.04 Ω·cm');
    expect(formatWithUncertainty(null, 1)).toBe('—');
  });
});

describe('formatDensity', () => {
  it('writes powers of ten in superscript', () => {
    expect(plain(formatDensity(1.34e15))).toBe('1.34 × 10¹⁵');
    expect(plain(formatDensityPerCm3(9.9999e19))).toBe('1.00 × 10²⁰ cm⁻³');
    expect(plain(formatDensity(2.5e-3, 2))).toBe('2.5 × 10⁻³');
    expect(formatDensityPerCm3(null)).toBe('—');
  });
});

describe('formatResistivity and formatSheetResistance', () => {
  it('choose the unit people say', () => {
    expect(plain(formatResistivity(0.85))).toBe('850.0 mΩ·cm');
    expect(plain(formatResistivity(10.0449))).toBe('10.04 Ω·cm');
    expect(plain(formatResistivity(2100))).toBe('2.100 kΩ·cm');
    expect(plain(formatSheetResistance(45.3))).toBe('45.30 Ω/□');
    expect(plain(formatSheetResistance(1200, 3))).toBe('1.20 kΩ/□');
  });
  it('choose it after rounding, so that 1000 mΩ·cm never appears', () => {
    expect(plain(formatResistivity(0.99999))).toBe('1.000 Ω·cm');
    expect(plain(formatResistivity(999.99))).toBe('1.000 kΩ·cm');
  });
});

describe('formatPercent and formatSignedPercent', () => {
  it('show the sign of a difference, and none on what rounds to zero', () => {
    expect(plain(formatPercent(0.8634))).toBe('0.86 %');
    expect(plain(formatSignedPercent(2.1))).toBe('+2.1 %');
    expect(plain(formatSignedPercent(-0.8))).toBe('\u22120.8 %');
    expect(plain(formatSignedPercent(-0.04))).toBe('0.0 %');
    expect(plain(formatSignedPercent(0.04))).toBe('0.0 %');
    expect(formatSignedPercent(null)).toBe('—');
  });
});

describe('dates', () => {
  it('are told in the zone of the site, whatever the zone of the machine', () => {
    const moment = new Date('2026-03-04T22:35:10Z');
    expect(formatDateTime(moment, 'UTC')).toBe('2026-03-04 22:35');
    expect(formatDateTime(moment, 'Asia/Kathmandu')).toBe('2026-03-05 04:20');
    expect(formatDate(moment, 'Asia/Kathmandu')).toBe('2026-03-05');
    expect(formatDate(null, 'UTC')).toBe('—');
  });
  it('write midnight as 00:00', () => {
    expect(formatDateTime(new Date('2026-03-04T00:00:00Z'), 'UTC')).toBe('2026-03-04 00:00');
  });
});

describe('formatAge', () => {
  const minute = 60_000;
  it.each([
    [0, 'under 1 min'],
    [12 * minute, '12 min'],
    [190 * minute, '3 h 10 min'],
    [180 * minute, '3 h'],
    [(2 * 24 + 4) * 60 * minute, '2 d 4 h'],
    [40 * 24 * 60 * minute, '40 d'],
  ])('tells %d ms as "%s"', (milliseconds, text) => {
    expect(plain(formatAge(milliseconds))).toBe(text);
  });
  it('does not go below zero for a clock that runs ahead', () => {
    expect(plain(formatAge(-5 * minute))).toBe('under 1 min');
  });
});

describe('shortDay', () => {
  it('names a day as an axis does', () => {
    expect(plain(shortDay('2031-04-05'))).toBe('5 Apr');
    expect(plain(shortDay(formatDateTime(new Date('2031-04-05T22:30:00Z'), 'Europe/Berlin')))).toBe('6 Apr');
    expect(shortDay('—')).toBe('—');
  });
});
