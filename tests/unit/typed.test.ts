import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { numberTyped, typedBox, typedNumber, typedNumberOrNone, typedText, typedTime } from '@/lib/typed';
import { formatDensity } from '@/lib/format';

const reasonOf = (schema: z.ZodType, value: unknown) => schema.safeParse(value).error?.issues[0]?.message;

describe('numberTyped', () => {
  it('reads decimals, exponents and densities as a page prints them', () => {
    expect(numberTyped('1.34e15')).toBe(1.34e15);
    expect(numberTyped(' 1.34 × 10¹⁵ ')).toBe(1.34e15);
    expect(numberTyped('2x10^-3')).toBe(2e-3);
    expect(numberTyped('−0.5')).toBe(-0.5);
  });

  it('reads back every density that a page writes, to the digits written', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e12, max: 1e21, noNaN: true }), (density) => {
        expect(numberTyped(formatDensity(density))).toBeCloseTo(Number(density.toPrecision(3)), -8);
        expect(numberTyped(formatDensity(density))! / density).toBeCloseTo(1, 2);
      }),
    );
  });

  it('takes nothing else for a number', () => {
    for (const text of ['', '1,5', '0x1F', 'Infinity', '1e400', '1.2.3', '10¹⁵ cm', 'e5']) {
      expect(numberTyped(text)).toBeNull();
    }
  });
});

describe('a number field', () => {
  const wish = { wish: 'a density above 0', holds: (value: number) => value > 0 };

  it('says what to give, in the words of the field', () => {
    expect(reasonOf(typedNumber(wish), '')).toBe('Give a density above 0.');
    expect(reasonOf(typedNumber(wish), '-1')).toBe('Give a density above 0.');
    expect(reasonOf(typedNumber(wish), '1,5')).toBe('Write a decimal point: 1.5.');
    expect(reasonOf(typedNumber(wish), 'much')).toBe('“much” is not a number. Give a density above 0.');
  });

  it('may be empty or absent only where nothing is an answer', () => {
    expect(typedNumberOrNone(wish).parse(' ')).toBeNull();
    expect(typedNumberOrNone(wish).parse(undefined)).toBeNull();
    expect(reasonOf(typedNumberOrNone(wish), '0')).toBe('Give a density above 0.');
  });
});

describe('other fields', () => {
  it('read an absent box as not ticked, in an object too', () => {
    const form = z.object({ box: typedBox });
    expect(form.parse({})).toEqual({ box: false });
    expect(form.parse({ box: 'on' })).toEqual({ box: true });
  });

  it('keep no null character, which the database could not', () => {
    expect(typedText({ most: 10 }).parse(' a\u0000b ')).toBe('ab');
    expect(reasonOf(typedText({ most: 10, ask: 'Say why.' }), '\u0000')).toBe('Say why.');
  });

  it('read a clock time in the zone of the site', () => {
    expect(typedTime('Europe/Berlin').parse('2031-07-05T06:07').toISOString()).toBe(
      '2031-07-05T04:07:00.000Z',
    );
    expect(reasonOf(typedTime('UTC'), 'soon')).toBe('Give a day and a time.');
  });
});
