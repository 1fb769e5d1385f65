import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { componentInterval } from '@/lib/control/component-interval';
import { nestedLevels, type NestedValue } from '@/lib/control/nested-levels';
import { remlComponents } from '@/lib/control/reml-components';
import { restrictedLikelihood } from '@/lib/control/restricted-likelihood';
import { varianceComponents } from '@/lib/control/variance-components';
import { chiSquareQuantile } from '@/lib/stats/chi-square';
import { seededRandom } from '@/lib/stats/seeded-random';

const NAMES = ['lot', 'wafer'];

/** A seeded line: lots, wafers within them, sites within those; `sizes` are the sites of each wafer of a lot. */
function line(
  seed: string,
  lots: number,
  sizes: readonly number[],
  sigmas: readonly [number, number, number],
) {
  const random = seededRandom(seed);
  const rows: NestedValue[] = [];
  for (let lot = 0; lot < lots; lot++) {
    const lotLevel = 100 + sigmas[0] * random.normal();
    sizes.forEach((sites, wafer) => {
      const level = lotLevel + sigmas[1] * random.normal();
      for (let site = 0; site < sites; site++) {
        rows.push({ labels: [`L${lot}`, `W${wafer}`], value: level + sigmas[2] * random.normal() });
      }
    });
  }
  return rows;
}

describe('nested variance components', () => {
  it('of two groups of two are what the definitions give by hand', () => {
    const rows = [1, 3, 6, 10].map((value, i) => ({ labels: [i < 2 ? 'A' : 'B'], value }));
    const { levels, mean, balanced } = varianceComponents(rows, ['lot']);
    expect(mean).toBe(5);
    expect(balanced).toBe(true);
    expect(levels.map((level) => level.sumOfSquares)).toEqual([36, 10]);
    expect(levels.map((level) => level.degreesOfFreedom)).toEqual([1, 2]);
    expect(levels[0]?.f).toBeCloseTo(7.2, 12);
    expect(levels[0]?.variance).toBeCloseTo((36 - 5) / 2, 12);
    expect(levels[1]?.variance).toBe(5);
    expect(levels[1]?.name).toBe('within');
  });

  it('add up the sums of squares to the whole, however unequal the groups', () => {
    const sizes = fc.array(fc.integer({ min: 1, max: 6 }), { minLength: 2, maxLength: 5 });
    fc.assert(
      fc.property(fc.string(), sizes, (seed, wafers) => {
        const rows = line(seed, 4, [...wafers, 3], [2, 1, 1]);
        const { levels, mean } = varianceComponents(rows, NAMES);
        const whole = rows.reduce((sum, { value }) => sum + (value - mean) ** 2, 0);
        expect(levels.reduce((sum, level) => sum + level.sumOfSquares, 0)).toBeCloseTo(whole, 7);
        expect(levels.reduce((sum, level) => sum + level.degreesOfFreedom, 0)).toBe(rows.length - 1);
      }),
      { numRuns: 30 },
    );
  });

  it('do not depend on the order of the rows or on the level, and grow with the square of the unit', () => {
    const rows = line('order', 5, [3, 1, 4], [2, 1, 1]);
    const plain = varianceComponents(rows, NAMES).levels;
    const moved = varianceComponents(
      [...rows].reverse().map(({ labels, value }) => ({ labels, value: 1e6 - 10 * value })),
      NAMES,
    ).levels;
    plain.forEach((level, j) => {
      expect(moved[j]?.variance).toBeCloseTo(100 * (level.variance ?? 0), 5);
      expect((moved[j]?.reml ?? 0) / (100 * (level.reml ?? 1))).toBeCloseTo(1, 7);
      expect((moved[j]?.interval?.low ?? 0) / 100).toBeCloseTo(level.interval?.low ?? 0, 5);
    });
  });

  it('take wafer 1 of two lots as two wafers', () => {
    const rows = [1, 2, 3, 4].map((value, i) => ({ labels: [i < 2 ? 'A' : 'B', '1'], value }));
    expect(varianceComponents(rows, NAMES).levels.map((level) => level.degreesOfFreedom)).toEqual([1, 0, 2]);
  });

  it('name the innermost level after its column where that already has one value a group', () => {
    const rows = line('single', 4, [1, 1, 1], [1, 1, 0]);
    expect(varianceComponents(rows, NAMES).levels.map((level) => level.name)).toEqual(NAMES);
  });

  it('are null where a level has no degree of freedom, and around it', () => {
    const rows = [1, 2, 4, 7].map((value, i) => ({ labels: [i < 2 ? 'A' : 'B', i < 2 ? '1' : '2'], value }));
    const { levels } = varianceComponents(rows, NAMES);
    expect(levels.map((level) => level.variance)).toEqual([null, null, 2.5]);
    expect(levels.map((level) => level.interval === null)).toEqual([true, true, false]);
    expect(levels.map((level) => level.reml)).toEqual([null, null, null]);
    expect(levels[1]?.meanSquare).toBeNull();
  });

  it('of equal values are zero, without F, interval or share', () => {
    const rows = line('equal', 3, [2, 2], [0, 0, 0]);
    for (const level of varianceComponents(rows, NAMES).levels) {
      expect(level).toMatchObject({ variance: 0, f: null, interval: null, reml: null, sharePercent: null });
    }
  });

  it('are not below zero, and the restricted likelihood falls from zero on where one would be', () => {
    const rows = [1, 9, 2, 8, 4, 5].map((value, i) => ({ labels: [`L${Math.floor(i / 2)}`], value }));
    const [lot] = varianceComponents(rows, ['lot']).levels;
    expect(lot?.estimate).toBeLessThan(0);
    expect(lot?.variance).toBe(0);
    expect(lot?.reml).toBe(0);
    const nested = nestedLevels(rows, ['lot']);
    const { cost, pull } = restrictedLikelihood(nested, remlComponents(nested) ?? []);
    expect(cost[0]).toBeGreaterThan(pull[0] ?? Infinity);
    expect(cost[1]).toBeCloseTo(pull[1] ?? NaN, 10);
  });

  it('by restricted likelihood are those of the analysis of variance with equal groups', () => {
    for (const level of varianceComponents(line('balanced', 6, [4, 4, 4], [3, 2, 1]), NAMES).levels) {
      expect((level.reml ?? 0) / (level.variance ?? 1)).toBeCloseTo(1, 10);
    }
  });

  it('refuse a single value, labels that do not fit, and what is no number', () => {
    expect(() => varianceComponents([{ labels: ['A'], value: 1 }], ['lot'])).toThrow(RangeError);
    expect(() => varianceComponents(line('x', 2, [2], [1, 1, 1]), ['lot'])).toThrow(RangeError);
    expect(() => varianceComponents([], [])).toThrow(RangeError);
    expect(() =>
      varianceComponents(
        [
          { labels: ['A'], value: NaN },
          { labels: ['B'], value: 1 },
        ],
        ['lot'],
      ),
    ).toThrow(RangeError);
  });
});

describe('the interval of a variance component', () => {
  it('is the chi-square interval of a mean square that stands alone', () => {
    const { low, high } = componentInterval({ value: 4, degreesOfFreedom: 12 }, null, 1);
    expect(low).toBeCloseTo(48 / chiSquareQuantile(0.975, 12), 10);
    expect(high).toBeCloseTo(48 / chiSquareQuantile(0.025, 12), 10);
  });

  it('is not below zero', () => {
    const below = { value: 10, degreesOfFreedom: 30 };
    expect(componentInterval({ value: 1, degreesOfFreedom: 4 }, below, 2)).toEqual({ low: 0, high: 0 });
  });
});

describe('intervals of variance components', () => {
  it('hold the truth as often as they say, within 94 and 96 % and 3.5 standard errors of the simulation', () => {
    const trials = 250;
    const held = [0, 0, 0];
    for (let i = 0; i < trials; i++) {
      const { levels } = varianceComponents(line(`coverage ${i}`, 10, [3, 3, 3], [2, 1, 1]), NAMES);
      levels.forEach(({ interval }, j) => {
        const truth = j === 0 ? 4 : 1;
        if (interval && interval.low <= truth && truth <= interval.high) held[j] = (held[j] ?? 0) + 1;
      });
    }
    const slack = 0.01 + 3.5 * Math.sqrt((0.05 * 0.95) / trials);
    for (const times of held) expect(Math.abs(times / trials - 0.95)).toBeLessThan(slack);
  });
});
