import { describe, expect, it } from 'vitest';
import { ewmaCharts } from '@/lib/control/ewma-charts';
import { nestedCharts } from '@/lib/control/nested-charts';
import { pooledSigma } from '@/lib/control/pooled-sigma';
import { c4 } from '@/lib/stats/c4';
import { referenceDataPresent, referenceRows } from '../support/reference-data';

describe.skipIf(!referenceDataPresent)('charts of published data', () => {
  it('give the EWMA of the NIST/SEMATECH e-Handbook, section 6.3.2.4, to its digits', () => {
    const rows = referenceRows('nist_ewma_example.csv').slice(1);
    const x = rows.map((row) => Number(row.x));
    const given = { target: 50, sigma: 2.0539 };
    const [chart] = ewmaCharts(x, { lambda: 0.3, width: 3 }, { ...given, limits: 'steady' });
    expect(chart?.upper).toBeCloseTo(52.5884, 4);
    // The handbook's lower limit is cut, not rounded, in its last place.
    expect(Math.abs((chart?.lower as number) - 47.4115)).toBeLessThan(1.1e-4);
    rows.forEach((row, i) => {
      const published = Number(row.ewma_published_2dp);
      expect(Math.abs((chart?.points[i] ?? 0) - published), `value ${i + 1}`).toBeLessThan(0.0051);
    });
    expect(chart?.signals).toEqual([]);
    const [grown] = ewmaCharts(x, { lambda: 0.3, width: 3 }, { ...given, limits: 'growing' });
    expect((grown?.upper as number[]).at(-1)).toBeCloseTo(52.5884, 4);
  });

  it('of furnace runs, e-Handbook 3.5.1, hold runs against runs, and zones by the published mean squares', () => {
    const runs = new Map<string, Map<string, number[]>>();
    for (const row of referenceRows('nist_furnace_oxide.csv')) {
      const zones = runs.get(row.run ?? '') ?? new Map<string, number[]>();
      runs.set(row.run ?? '', zones);
      zones.set(row.zone ?? '', [...(zones.get(row.zone ?? '') ?? []), Number(row.thickness_angstrom)]);
    }
    const nested = [...runs.values()].map((zones) => [...zones.values()]);
    const [level, , between, within] = nestedCharts(nested, { rules: [], limits: 'classical' });
    expect(level?.centre).toBeCloseTo(563.0357, 4);
    expect(level?.points).toHaveLength(21);
    // Zone means: pooled variance is the published mean square of zones over two wafers, 571.659/2, 63 df.
    expect((((between?.centre as number) / c4(4)) * c4(64)) ** 2).toBeCloseTo(571.659 / 2, 2);
    expect(within?.points).toHaveLength(84);
    // Within zones: the published mean square 120.893 with 84 degrees of freedom is pooled s².
    expect((pooledSigma(nested.flat()) * c4(85)) ** 2).toBeCloseTo(120.893, 3);
  });
});
