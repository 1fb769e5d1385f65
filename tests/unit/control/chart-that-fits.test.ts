import { describe, expect, it } from 'vitest';
import { chartThatFits } from '@/lib/control/chart-that-fits';
import { varianceComponents } from '@/lib/control/variance-components';
import { seededRandom } from '@/lib/stats/seeded-random';

/** Twelve groups of five values, whose means differ by so many σ of what is within. */
function levels(between: number) {
  const random = seededRandom('chart');
  const rows = Array.from({ length: 12 }, (_, group) => {
    const level = between * random.normal();
    return Array.from({ length: 5 }, () => ({ labels: [`${group}`], value: level + random.normal() }));
  });
  return varianceComponents(rows.flat(), ['wafer']).levels;
}

describe('the chart that fits', () => {
  it('is three-way where groups differ by more than what is within them, and says how narrow the other would be', () => {
    const found = chartThatFits(levels(2));
    expect(found.chart).toBe('three-way');
    // √(1 + 5·2²) = 4.6 by the components the values were made with; F of 11 and 48 degrees of freedom scatters.
    expect(found.tooNarrow).toBeGreaterThan(2.5);
    expect(found.tooNarrow).toBeLessThan(7.5);
  });

  it('is mean and s where they do not', () => {
    expect(chartThatFits(levels(0)).chart).toBe('mean-s');
  });

  it('is nested with groups within groups, and individuals without any', () => {
    const [outer, inner] = levels(2);
    if (!outer || !inner) throw new RangeError('two levels were made');
    expect(chartThatFits([outer, outer, inner]).chart).toBe('nested');
    expect(chartThatFits([inner])).toEqual({ chart: 'individuals', tooNarrow: null });
    expect(chartThatFits([{ f: null, p: null }, inner]).chart).toBe('three-way');
    expect(() => chartThatFits([])).toThrow(RangeError);
  });
});
