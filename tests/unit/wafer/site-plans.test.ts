import { describe, expect, it } from 'vitest';
import { crossSites } from '@/lib/wafer/cross-sites';
import { latticeSites } from '@/lib/wafer/lattice-sites';
import { polarSites } from '@/lib/wafer/polar-sites';
import { scanSites } from '@/lib/wafer/scan-sites';
import type { Site } from '@/lib/wafer/site';

const radius = ({ xMm, yMm }: Site) => Math.hypot(xMm, yMm);

describe('site plans', () => {
  it('a polar plan has the centre and 8k sites on ring k: 9, 25, 49, 81, 121 (common practice, no source)', () => {
    expect([0, 1, 2, 3, 4, 5].map((rings) => polarSites(rings, 72).length)).toEqual([1, 9, 25, 49, 81, 121]);
    const onRings = polarSites(3, 72).map((site) => Math.round((3 * radius(site)) / 72));
    expect([0, 1, 2, 3].map((k) => onRings.filter((ring) => ring === k).length)).toEqual([1, 8, 16, 24]);
  });

  it('a polar plan has its sites on the axes exactly there', () => {
    for (const sites of [polarSites(1, 93), polarSites(5, 147)]) {
      const smallest = Math.min(
        ...sites.flatMap(({ xMm, yMm }) => [xMm, yMm].filter((v) => v !== 0).map(Math.abs)),
      );
      expect(smallest).toBeGreaterThan(1);
      expect(sites.filter(({ xMm }) => xMm === 0)).toHaveLength(sites.filter(({ yMm }) => yMm === 0).length);
    }
  });

  it('a cross of nine sites is a cross of five and four sites at the full radius', () => {
    expect(crossSites(5, 90).map(radius)).toEqual([0, 45, 45, 45, 45]);
    expect(crossSites(9, 90).slice(0, 5)).toEqual(crossSites(5, 90));
    expect(crossSites(9, 90).slice(5).map(radius)).toEqual([90, 90, 90, 90]);
  });

  it('a diameter scan runs through the centre from rim to rim, at any angle', () => {
    const scan = scanSites(25, 97, 30);
    expect(radius(scan[12]!)).toBeCloseTo(0, 12);
    expect(radius(scan[0]!)).toBeCloseTo(97, 10);
    expect(scan[24]!.yMm / scan[24]!.xMm).toBeCloseTo(Math.tan(Math.PI / 6), 10);
  });

  it('a lattice fills the quality circle and keeps the sites on its border', () => {
    expect(latticeSites(10, 10)).toHaveLength(5);
    expect(latticeSites(5, 70).length / ((Math.PI * 70 * 70) / 25)).toBeCloseTo(1, 1);
    expect(Math.max(...latticeSites(6.16, 72).map(radius))).toBeLessThanOrEqual(72 * (1 + 1e-9));
  });

  it('refuse what makes no plan', () => {
    expect(() => polarSites(1.5, 72)).toThrow(RangeError);
    expect(() => polarSites(-1, 72)).toThrow(RangeError);
    expect(() => polarSites(2, 0)).toThrow(RangeError);
    expect(() => polarSites(2, NaN)).toThrow(RangeError);
    expect(() => crossSites(7 as 5, 72)).toThrow(RangeError);
    expect(() => scanSites(24, 72)).toThrow(RangeError);
    expect(() => scanSites(25, 72, Infinity)).toThrow(RangeError);
    expect(() => latticeSites(0, 72)).toThrow(RangeError);
    expect(() => latticeSites(0.1, 72)).toThrow('10 000');
  });
});
