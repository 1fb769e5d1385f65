import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { areaWeights } from '@/lib/wafer/area-weights';
import { polarSites } from '@/lib/wafer/polar-sites';
import { polygonDiscArea, type Corner } from '@/lib/wafer/polygon-disc-area';
import { scanSites } from '@/lib/wafer/scan-sites';

describe('polygonDiscArea', () => {
  it('gives the parts that elementary geometry gives', () => {
    const quarter: Corner[] = [
      [0, 0],
      [2, 0],
      [0, 2],
    ];
    expect(polygonDiscArea(quarter, 1)).toBeCloseTo(Math.PI / 4, 12);
    const half: Corner[] = [
      [0, -5],
      [5, -5],
      [5, 5],
      [0, 5],
    ];
    expect(polygonDiscArea(half, 1)).toBeCloseTo(Math.PI / 2, 12);
    expect(polygonDiscArea([...half].reverse(), 1)).toBeCloseTo(Math.PI / 2, 12);
    const segment = half.map(([x, y]): Corner => [x + 0.5, y]);
    expect(polygonDiscArea(segment, 1)).toBeCloseTo(Math.acos(0.5) - 0.5 * Math.sqrt(0.75), 12);
    const inside = half.map(([x, y]): Corner => [x / 50, y / 50]);
    expect(polygonDiscArea(inside, 1)).toBeCloseTo(0.02, 12);
    const beside = half.map(([x, y]): Corner => [x + 3, y]);
    expect(polygonDiscArea(beside, 1)).toBeCloseTo(0, 12);
  });
});

describe('areaWeights', () => {
  it('add up to one, and are fair shares where the plan is fair', () => {
    for (const rings of [1, 2, 3, 5]) {
      const weights = areaWeights(polarSites(rings, 97), 97);
      expect(weights.reduce((sum, w) => sum + w, 0)).toBeCloseTo(1, 12);
    }
    const four = [
      { xMm: 10, yMm: 10 },
      { xMm: -10, yMm: 10 },
      { xMm: -10, yMm: -10 },
      { xMm: 10, yMm: -10 },
    ];
    for (const weight of areaWeights(four, 50)) expect(weight).toBeCloseTo(0.25, 12);
  });

  it('give the centre of nine sites the octagon within half the radius', () => {
    expect(areaWeights(polarSites(1, 80), 80)[0]).toBeCloseTo(
      (8 * Math.tan(Math.PI / 8) * 0.25) / Math.PI,
      12,
    );
  });

  it('work for none, one, two sites and sites on one line', () => {
    expect(areaWeights([], 50)).toHaveLength(0);
    expect([...areaWeights([{ xMm: 3, yMm: 4 }], 50)]).toEqual([1]);
    const two = areaWeights(
      [
        { xMm: -5, yMm: 0 },
        { xMm: 5, yMm: 0 },
      ],
      50,
    );
    expect(two[0]).toBeCloseTo(0.5, 4);
    const scan = areaWeights(scanSites(25, 50, 20), 50);
    expect(scan.reduce((sum, w) => sum + w, 0)).toBeCloseTo(1, 9);
    expect(scan[12]).toBeGreaterThan(scan[0]!);
    expect(() => areaWeights([], 0)).toThrow(RangeError);
  });

  it('agree with counting the places nearest to each site', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.tuple(fc.integer({ min: -34, max: 34 }), fc.integer({ min: -34, max: 34 })), {
          minLength: 3,
          maxLength: 12,
          selector: ([x, y]) => `${x},${y}`,
        }),
        (places) => {
          const sites = places.map(([xMm, yMm]) => ({ xMm, yMm: yMm + 0.01 * xMm * xMm }));
          const counts = new Array<number>(sites.length).fill(0);
          let total = 0;
          for (let x = -49.5; x < 50; x++) {
            for (let y = -49.5; y < 50; y++) {
              if (x * x + y * y > 2500) continue;
              const far = sites.map((s) => Math.hypot(s.xMm - x, s.yMm - y));
              counts[far.indexOf(Math.min(...far))]!++;
              total++;
            }
          }
          areaWeights(sites, 50).forEach((w, i) =>
            expect(Math.abs(w - counts[i]! / total)).toBeLessThan(0.02),
          );
        },
      ),
      { numRuns: 20, seed: 11 },
    );
  });
});
