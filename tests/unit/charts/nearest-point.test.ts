import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nearestPoint } from '@/app/_charts/nearest-point';

describe('nearestPoint', () => {
  it('finds nothing among none and the only one among one', () => {
    expect(nearestPoint([], 3)).toBeNull();
    expect(nearestPoint([{ index: 9 }], -100)).toBe(0);
  });

  it('prefers the earlier of two that are equally near', () => {
    expect(nearestPoint([{ index: 3 }, { index: 7 }], 5)).toBe(0);
    expect(nearestPoint([{ index: 3 }, { index: 7 }], 5.5)).toBe(1);
  });

  it('agrees with looking at every point', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 0, max: 999 }), { minLength: 1 }),
        fc.double({ min: -50, max: 1050, noNaN: true }),
        (indices, at) => {
          const points = indices.sort((a, b) => a - b).map((index) => ({ index }));
          const found = points[nearestPoint(points, at) ?? -1];
          expect(Math.abs((found?.index ?? Number.NaN) - at)).toBe(
            Math.min(...points.map((one) => Math.abs(one.index - at))),
          );
        },
      ),
    );
  });
});
