import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { plainNumber } from '@/lib/maps/plain-number';
import { readNumber } from '@/lib/maps/read-number';

function read(text: string, from = 0) {
  const into = new Float64Array(1);
  const end = plainNumber(text, from, into, 0);
  return end === -1 ? null : { value: into[0], end };
}

const digits = (most: number) => fc.string({ unit: fc.constantFrom(...'0123456789'), maxLength: most });

describe('plainNumber', () => {
  it('reads the number that stands in a text and says where it ends', () => {
    expect(read('a,-12.5,b', 2)).toEqual({ value: -12.5, end: 7 });
    expect(read(' 1.5e3 ,b')).toEqual({ value: 1500, end: 7 });
    expect(read('+.5')).toEqual({ value: 0.5, end: 3 });
  });

  it('reads nothing where no number in decimal notation stands, or one beyond 1e150', () => {
    for (const text of [
      '',
      ' ',
      ',1',
      'x',
      '-',
      '.',
      'e5',
      '1e',
      '1e+',
      'NaN',
      'Infinity',
      '1e151',
      '-1e999',
    ])
      expect(read(text)).toBeNull();
  });

  it('agrees with Number to the last bit on every notation', () => {
    const notation = fc.tuple(
      fc.constantFrom('', '-', '+'),
      digits(19),
      fc.constantFrom('', '.'),
      digits(19),
      fc.constantFrom('', 'e', 'E'),
      fc.integer({ min: -140, max: 100 }),
    );
    fc.assert(
      fc.property(notation, ([sign, before, point, behind, exponent, power]) => {
        const text = sign + before + point + (point === '' ? '' : behind) + (exponent && exponent + power);
        const value = Number(text);
        if (!/\d/.test(before + (point && behind)) || Math.abs(value) > 1e150) expect(read(text)).toBeNull();
        else expect(Object.is(read(text)?.value, value)).toBe(true);
      }),
      { numRuns: 5000 },
    );
    fc.assert(
      fc.property(fc.double({ noNaN: true, min: -1e150, max: 1e150 }), (value) => {
        const text = String(value);
        expect(read(text)?.value).toBe(Number(text));
      }),
    );
  });
});

describe('readNumber', () => {
  it('reads a whole cell: null where it is empty, NaN where more than a number stands in it', () => {
    expect(['', ' \t', '\t2 ', '1 2', '1,5', '0x10', '1_000'].map(readNumber)).toEqual([
      null,
      null,
      2,
      ...[NaN, NaN, NaN, NaN],
    ]);
  });
});
