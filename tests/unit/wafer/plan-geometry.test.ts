import { describe, expect, it } from 'vitest';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';

const diameterMm = 200;

describe('planGeometry', () => {
  it('refuses sites off the wafer, sites there twice, and an exclusion without a diameter', () => {
    const at = (xMm: number, yMm = 0) => ({ xMm, yMm });
    expect(() => planGeometry([at(101)], { diameterMm, edgeExclusionMm: 0 })).toThrow('lies off');
    expect(() => planGeometry([at(1), at(1)], { diameterMm, edgeExclusionMm: 0 })).toThrow('twice');
    expect(() => planGeometry([at(NaN)], { diameterMm, edgeExclusionMm: 0 })).toThrow(RangeError);
    expect(() => planGeometry([at(1)], { diameterMm: null, edgeExclusionMm: 3 })).toThrow('diameter');
    expect(() => planGeometry([at(1)], { diameterMm, edgeExclusionMm: 100 })).toThrow('nothing');
    expect(() => planGeometry([at(1)], { diameterMm: -1, edgeExclusionMm: 0 })).toThrow(RangeError);
  });

  it('keeps a site on the border of the quality area', () => {
    expect(planGeometry(polarSites(3, 97), { diameterMm, edgeExclusionMm: 3 }).excludedSites).toBe(0);
  });
});
