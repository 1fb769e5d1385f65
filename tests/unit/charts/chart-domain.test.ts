import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chartDomain } from '@/app/_charts/chart-domain';

describe('chartDomain', () => {
  it('holds all points and limits with a margin', () => {
    expect(chartDomain([1, 3, 2], [], { margin: 0.1 })).toEqual([0.8, 3.2]);
  });

  it('has some width for none, for one, and for all equal', () => {
    expect(chartDomain([], [], { margin: 0 })).toEqual([0, 1]);
    expect(chartDomain([5, 5], [], { margin: 0 })).toEqual([4.95, 5.05]);
    expect(chartDomain([0], [], { margin: 0 })).toEqual([-1, 1]);
  });

  it('widens for what is wished while the points keep their share of the height', () => {
    expect(chartDomain([0, 1], [[-0.5, 1.5]], { margin: 0, most: 2.2 })).toEqual([-0.5, 1.5]);
    expect(chartDomain([0, 1], [[-5, 5]], { margin: 0, most: 2.2 })).toEqual([0, 1]);
  });

  it('grants a later wish that an earlier, wider one did not get', () => {
    const wishes = [
      [-9, 9],
      [0, 1.2],
    ];
    expect(chartDomain([0, 1], wishes, { margin: 0 })).toEqual([0, 1.2]);
  });

  it('begins where it is told to, with half a margin under it', () => {
    expect(chartDomain([2, 4], [], { margin: 0.5, from: 0 })).toEqual([-1, 6]);
    expect(chartDomain([0, 0], [], { margin: 0, from: 0 })).toEqual([0, 1]);
  });

  it('shifts with its numbers', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -99, max: 99 }), { minLength: 2 }), (values) => {
        fc.pre(new Set(values).size > 1);
        const [low, high] = chartDomain(values);
        const [lowMoved, highMoved] = chartDomain(values.map((value) => value + 1e6));
        expect(lowMoved - 1e6).toBeCloseTo(low, 6);
        expect(highMoved - 1e6).toBeCloseTo(high, 6);
      }),
    );
  });

  it('refuses numbers that are not finite', () => {
    expect(() => chartDomain([Number.NaN])).toThrow(RangeError);
    expect(() => chartDomain([1], [[Number.POSITIVE_INFINITY]])).toThrow(RangeError);
  });
});
