import { describe, expect, it } from 'vitest';
import { c4 } from '@/lib/stats/c4';
import { lagOneAutocorrelation } from '@/lib/stats/lag-one-autocorrelation';
import { mean } from '@/lib/stats/mean';
import { rangeConstants } from '@/lib/stats/range-distribution';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { referenceDataPresent, referenceRows } from '../support/reference-data';

/** Digits in which a computed value agrees with a certified one, as NIST counts them. */
function digits(computed: number | null, certified: number): number {
  if (computed === null) return 0;
  return computed === certified ? 15 : -Math.log10(Math.abs((computed - certified) / certified));
}

/** The constants of a control chart from c4, d2 and d3 (definitions of ASTM MNL7). */
function constants(n: number): Record<string, number> {
  const { d2, d3 } = rangeConstants(n);
  const c = c4(n);
  const spread = (3 * Math.sqrt(1 - c * c)) / c;
  return {
    A2: 3 / (d2 * Math.sqrt(n)),
    A3: 3 / (c * Math.sqrt(n)),
    c4: c,
    B3: Math.max(0, 1 - spread),
    B4: 1 + spread,
    d2,
    d3,
    D3: Math.max(0, 1 - (3 * d3) / d2),
    D4: 1 + (3 * d3) / d2,
  };
}

describe.skipIf(!referenceDataPresent)('published data', () => {
  // NIST StRD, univariate summary statistics: certified mean, standard deviation, lag-1 autocorrelation.
  it.each([
    ['nist_numacc1.csv', 10000002, 1, -0.5],
    ['nist_numacc2.csv', 1.2, 0.1, -0.999],
    ['nist_numacc3.csv', 1000000.2, 0.1, -0.999],
    ['nist_numacc4.csv', 10000000.2, 0.1, -0.999],
  ])('%s comes out to twelve digits or more', (file, m, s, r) => {
    const y = referenceRows(file).map((row) => Number(row.y));
    expect(digits(mean(y), m)).toBeGreaterThan(12);
    expect(digits(sampleStandardDeviation(y), s)).toBeGreaterThan(12);
    expect(digits(lagOneAutocorrelation(y), r)).toBeGreaterThan(12);
  });

  it('the constants of control charts agree with their exact values to 1e-6', () => {
    const rows = referenceRows('control_chart_constants_exact.csv');
    expect(rows).toHaveLength(24);
    for (const row of rows) {
      for (const [name, computed] of Object.entries(constants(Number(row.n)))) {
        expect(Math.abs(computed - Number(row[name])), `${name}(${row.n})`).toBeLessThan(1e-6);
      }
    }
  });

  it('the constants round to the table of ASTM MNL7, but for its eight known slips in the last place', () => {
    const slips: string[] = [];
    for (const row of referenceRows('control_chart_constants_published.csv')) {
      for (const [name, computed] of Object.entries(constants(Number(row.n)))) {
        const places = (row[name] ?? '').split('.')[1]?.length ?? 0;
        const unit = 10 ** -places;
        const difference = Math.abs(computed - Number(row[name]));
        expect(difference, `${name}(${row.n})`).toBeLessThan(1.5 * unit);
        if (difference > 0.5 * unit + 1e-7) slips.push(`${name}(${row.n})`);
      }
    }
    const known = ['D4(3)', 'D4(18)', 'd3(19)', 'D3(19)', 'D4(19)', 'D3(22)', 'D4(22)', 'D3(24)'];
    expect(slips.sort()).toEqual(known.sort());
  });
});
