import { describe, expect, it } from 'vitest';
import type { Target } from '@/lib/physics/target';
import { discPositionFactor } from '@/lib/probe/disc-position-factor';
import { INFINITE_SHEET_FACTOR } from '@/lib/probe/disc-factor';
import { mapAt23C } from '@/lib/probe/map-at-23c';
import { siteFactors, type ProbeGeometry } from '@/lib/probe/site-factors';
import { spacingFactor } from '@/lib/probe/spacing-factor';
import { thicknessFactor } from '@/lib/probe/thickness-factor';
import { uniformBoron as boron } from '../../support/uniform-boron';

const probe: ProbeGeometry = {
  spacingMm: 1,
  innerSpacingMm: null,
  angleRadians: 0,
  diameterMm: 200,
  thicknessUm: null,
};
describe('the factors of the sites of a wafer', () => {
  it('fall towards the edge across the radius, and say nothing where a pin stands off the disc', () => {
    const sites = [0, 50, 90, 97, 99, 99.9].map((xMm) => ({ xMm, yMm: 0 }));
    const across = siteFactors(sites, { ...probe, angleRadians: Math.PI / 2 });
    const factors = across.slice(0, 5).map((factor) => factor ?? Number.NaN);
    expect([...factors].sort((a, b) => b - a)).toEqual(factors);
    expect(factors[0]).toBeCloseTo(INFINITE_SHEET_FACTOR, 2);
    expect(factors[4] ?? 0).toBeLessThan(0.75 * INFINITE_SHEET_FACTOR);
    // 1.5 mm across at 99.9 mm lies 99.911 mm from the centre, inside; along the radius it lies outside.
    expect(across[5]).not.toBeNull();
    expect(siteFactors(sites, probe)[5]).toBeNull();
  });

  it('take the direction of each site’s radius where the probe turns with the stage', () => {
    const site = { xMm: 60, yMm: 70 };
    const [turned] = siteFactors([site], { ...probe, angleRadians: null });
    expect(turned).toBe(discPositionFactor(site, Math.atan2(70, 60), 1, 100));
  });

  it('multiply in uneven pins and a thickness that counts', () => {
    const [plain] = siteFactors([{ xMm: 0, yMm: 0 }], probe);
    const [both] = siteFactors([{ xMm: 0, yMm: 0 }], { ...probe, innerSpacingMm: 0.99, thicknessUm: 500 });
    expect((both ?? 0) / (plain ?? 1)).toBeCloseTo(spacingFactor(0.99, 1) * thicknessFactor(0.5), 12);
  });

  it('refuse a probe that does not fit', () => {
    expect(() => siteFactors([], { ...probe, diameterMm: 2.9 })).toThrow(RangeError);
    expect(() => siteFactors([], { ...probe, spacingMm: 0 })).toThrow(RangeError);
  });
});

describe('a map of V/I as values at 23 °C', () => {
  const sites = [
    { xMm: 0, yMm: 0 },
    { xMm: 80, yMm: 20 },
  ];
  const thick = { ...probe, thicknessUm: 725 };

  it('gives resistivity by the thickness and the coefficient of each reading (ASTM F84)', () => {
    const factors = siteFactors(sites, thick);
    const resistances = factors.map((factor) => 10 / 0.0725 / (factor ?? 1));
    // 0.8248 % per °C for p-type at 10 Ω·cm.
    for (const value of mapAt23C(boron, sites, resistances, thick, 25)) {
      expect(value).toBeCloseTo(10 * (1 - 0.02 * 0.8248), 4);
    }
  });

  it('leaves out a site without a reading, and one too far out for any silicon', () => {
    const values = mapAt23C(boron, sites, [null, 1e6], thick, 25);
    expect(values).toEqual([null, null]);
  });

  it('moves a layer by the coefficient of its own profile, the same everywhere', () => {
    const layer: Target = {
      ...boron,
      quantity: 'sheet_resistance',
      profile: 'gaussian',
      densityPerCm3: 1e19,
      lengthUm: 0.5,
      backgroundDopant: 'phosphorus',
      backgroundDensityPerCm3: 1e15,
    };
    const at23C = mapAt23C(layer, sites, [40, 40], probe, 23);
    const at25C = mapAt23C(layer, sites, [40, 40], probe, 25);
    const ratios = at25C.map((value, i) => (value ?? 0) / (at23C[i] ?? 1));
    expect(ratios[0]).toBeCloseTo(ratios[1] ?? 0, 12);
    // Heavily doped boron: a quarter of the coefficient of the silicon that has 10 Ω·cm, and positive.
    expect(ratios[0] ?? 0).toBeLessThan(1);
    expect(ratios[0] ?? 0).toBeGreaterThan(1 - 2 * 0.003);
  });

  it('refuses a resistivity without thickness and lists of different length', () => {
    expect(() => mapAt23C(boron, sites, [1, 1], probe, 23)).toThrow(/thickness/);
    expect(() => mapAt23C(boron, sites, [1], thick, 23)).toThrow(/2 sites/);
  });
});
