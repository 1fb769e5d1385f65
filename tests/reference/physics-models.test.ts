import { describe, expect, it } from 'vitest';
import { aroraMobility } from '@/lib/physics/arora-mobility';
import { conductionResistivity, type MobilityModel } from '@/lib/physics/conduction-resistivity';
import { intrinsicDensity } from '@/lib/physics/intrinsic-density';
import { ionizedFraction } from '@/lib/physics/ionized-fraction';
import { klaassenMobility } from '@/lib/physics/klaassen-mobility';
import { masettiMobility } from '@/lib/physics/masetti-mobility';
import { modelUncertaintyPercent } from '@/lib/physics/model-uncertainty';
import { polynomial } from '@/lib/physics/polynomial';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

/** Resistivity of phosphorus at 300 K, NBS Special Publication 400-64 (1981) [1]. */
function phosphorus300K(density: number): number {
  const x = Math.log10(density) - 16;
  const z =
    polynomial([-3.0652, 2.1853, -0.6108, 0.056189], x) / polynomial([1, -0.67642, 0.19542, -0.0181], x);
  return (6.242e18 * 10 ** z) / density;
}

/** Resistivity of boron at 300 K by the product fit on density, NBS Special Publication 400-64 (1981) [1]. */
function boron300K(density: number): number {
  return (0.00215 + (0.02053 - 0.00215) / (1 + (density / 4.09e18) ** -0.727)) / (1.602e-19 * density);
}

const doped = (donors: number, acceptors: number) => ({
  donor: 'phosphorus' as const,
  donorsPerCm3: donors,
  acceptorsPerCm3: acceptors,
});

describe('the two-carrier conduction law at 300 K with the Masetti model', () => {
  // Masetti, Severi, Solmi (1983) with ni of Misiakos and Tsamakis (1993) [calc].
  it('gives compensated silicon 2.258 Ω·cm where the net doping alone would say 1.44', () => {
    expect(conductionResistivity('masetti', doped(9e16, 1e17), 300)).toBeCloseTo(2.258, 3);
    expect(standardResistivity('boron', 1e16)).toBeCloseTo(1.44, 2);
  });

  it('lifts fully compensated silicon above intrinsic, to 4.37e5 Ω·cm', () => {
    expect(conductionResistivity('masetti', doped(1e16, 1e16), 300) / 4.37e5).toBeCloseTo(1, 2);
  });

  it('counts both carriers at 1e10 per cm³: 2.47e5 Ω·cm', () => {
    expect(conductionResistivity('masetti', doped(1e10, 0), 300) / 2.47e5).toBeCloseTo(1, 2);
  });

  it('puts intrinsic silicon between 3.2e5 and 3.6e5 Ω·cm', () => {
    const intrinsic = conductionResistivity('masetti', doped(0, 0), 300);
    expect(intrinsic).toBeGreaterThan(3.2e5);
    expect(intrinsic).toBeLessThan(3.6e5);
  });

  it('has 9.696e9 intrinsic carriers per cm³ (Misiakos and Tsamakis, 1993) [2]', () => {
    expect(intrinsicDensity(300) / 9.696e9).toBeCloseTo(1, 4);
  });
});

describe('the mobility models against the 300 K fits of SP 400-64', () => {
  it.each<[MobilityModel, number, number]>([
    ['masetti', 11, 10.1],
    ['arora', 8.7, 11.9],
    ['klaassen', 7.4, 9.5],
  ])('%s differs by at most its stated spread: %s percent for boron, %s for phosphorus', (model, p, n) => {
    let [boron, phosphorus] = [0, 0];
    for (let x = 13; x <= 20.0001; x += 0.02) {
      const density = 10 ** x;
      const b = conductionResistivity(model, doped(0, density), 300) / boron300K(density) - 1;
      const f = conductionResistivity(model, doped(density, 0), 300) / phosphorus300K(density) - 1;
      boron = Math.max(boron, Math.abs(b) * 100);
      phosphorus = Math.max(phosphorus, Math.abs(f) * 100);
    }
    expect(boron).toBeCloseTo(p, 1);
    expect(phosphorus).toBeCloseTo(n, 1);
    expect(modelUncertaintyPercent(model, 'boron') * Math.sqrt(3)).toBeCloseTo(p, 10);
    expect(modelUncertaintyPercent(model, 'phosphorus') * Math.sqrt(3)).toBeCloseTo(n, 10);
  });

  it('agree on the published plateau of electrons and holes in pure silicon', () => {
    const pure = { ...doped(1e12, 0), electronsPerCm3: 1e12, holesPerCm3: 1e8 };
    expect(klaassenMobility('electron', pure, 300)).toBeCloseTo(1414, -1);
    expect(masettiMobility('phosphorus', 1e13)).toBeCloseTo(1414, -1);
    expect(masettiMobility('boron', 1e13)).toBeCloseTo(470.5, 0);
    // Arora, Hauser, Roulston: 88 + 7.40e8·300^−2.33 and 54.3 + 1.36e8·300^−2.23 [calc].
    expect(aroraMobility('electron', 0, 300)).toBeCloseTo(88 + 7.4e8 * 300 ** -2.33, 6);
    expect(aroraMobility('hole', 0, 300)).toBeCloseTo(54.3 + 1.36e8 * 300 ** -2.23, 6);
  });
});

describe('the share of ionized dopants at 300 K', () => {
  // Altermatt, Schenk, Geelhaar, Heiser (2006) [1], values [calc].
  it.each<['boron' | 'phosphorus', number, number]>([
    ['boron', 1e16, 0.993],
    ['boron', 1e17, 0.939],
    ['boron', 1e18, 0.764],
    ['boron', 1e19, 0.872],
    ['phosphorus', 1e16, 0.996],
    ['phosphorus', 1e17, 0.962],
    ['phosphorus', 1e18, 0.791],
    ['phosphorus', 1e19, 0.901],
  ])('is for %s at %s per cm³ %s', (dopant, density, share) => {
    // One unit of the last digit: boron at 1e18 comes to 0.7635.
    expect(Math.abs((ionizedFraction(dopant, density, 300) ?? 0) - share)).toBeLessThan(1e-3);
  });

  it('is one in lightly doped silicon, and unknown for antimony', () => {
    expect(ionizedFraction('phosphorus', 1e13, 300)).toBeCloseTo(1, 4);
    expect(ionizedFraction('antimony', 1e18, 300)).toBeNull();
    expect(() => ionizedFraction('boron', 0, 300)).toThrow(RangeError);
  });
});
