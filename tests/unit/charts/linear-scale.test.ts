import { describe, expect, it } from 'vitest';
import { linearScale } from '@/app/_charts/linear-scale';

describe('linearScale', () => {
  it('maps the ends of the domain to the ends of the range and keeps proportions', () => {
    const x = linearScale([-2, 2], [0, 100]);
    expect([x(-2), x(1), x(2), x(4)]).toEqual([0, 75, 100, 150]);
  });

  it('keeps values inside the range when asked to', () => {
    const x = linearScale([0, 1], [10, 20], { clamp: true });
    expect([x(-5), x(5)]).toEqual([10, 20]);
  });

  it('refuses a domain of no width and values that are not finite', () => {
    expect(() => linearScale([1, 1], [0, 1])).toThrow(RangeError);
    expect(() => linearScale([0, Number.POSITIVE_INFINITY], [0, 1])).toThrow(RangeError);
    expect(() => linearScale([0, 1], [0, 1])(Number.NaN)).toThrow(RangeError);
  });
});
