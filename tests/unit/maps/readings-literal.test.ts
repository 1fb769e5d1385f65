import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { arrayLiteral } from '@/lib/database/columnar';
import { readingsLiteral } from '@/lib/maps/readings-literal';

describe('readingsLiteral', () => {
  it('writes readings as an array literal, those that were not taken as NULL', () => {
    expect(readingsLiteral([12.5, null, 0.000001, 100, -0, -3.25])).toBe('{12.5,NULL,0.000001,100,0,-3.25}');
    expect(readingsLiteral([])).toBe('{}');
  });

  it('writes each number as String does, whatever its size and its decimals', () => {
    const few = fc
      .tuple(fc.integer({ min: -(10 ** 15), max: 10 ** 15 }), fc.integer({ min: 0, max: 12 }))
      .map(([whole, decimals]) => whole / 10 ** decimals);
    fc.assert(
      fc.property(fc.array(fc.oneof(few, fc.double(), fc.constant(null)), { maxLength: 200 }), (readings) => {
        expect(readingsLiteral(readings)).toBe(arrayLiteral(readings));
      }),
      { numRuns: 2000 },
    );
  });
});
