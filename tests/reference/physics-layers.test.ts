import { describe, expect, it } from 'vitest';
import { depletionWidth } from '@/lib/physics/depletion-width';
import type { Dopant } from '@/lib/physics/dopant';
import { scheilDensity } from '@/lib/physics/scheil-density';
import { sheetResistance } from '@/lib/physics/sheet-resistance';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

// [calc]: recomputed from the standard conversion and J. C. Irvin's integral, Bell Syst. Tech. J. 41, 387 (1962).
describe('the sheet resistance of a layer', () => {
  it('gives the gaussian boron layer its junction, dose and resistance [calc]', () => {
    const figures = sheetResistance({
      profile: 'gaussian',
      dopant: 'boron',
      peakDensityPerCm3: 1e19,
      lengthUm: 0.5,
      backgroundDopant: 'phosphorus',
      backgroundDensityPerCm3: 1e15,
    });
    expect(figures.junctionDepthUm).toBeCloseTo(1.517, 3);
    expect(figures.dosePerCm2 / 4.431e14).toBeCloseTo(1, 4);
    expect(figures.sheetResistanceOhmSq).toBeCloseTo(170.0, 1);
  });

  it.each<[Dopant, number, number, number]>([
    ['phosphorus', 1e19, 0.3, 192.5],
    ['boron', 1e20, 0.1, 116.9],
  ])('gives a box of %s at %s per cm³ and %s µm its %s Ω/□ [calc]', (dopant, density, thicknessUm, ohmSq) => {
    const figures = sheetResistance({
      profile: 'box',
      dopant,
      peakDensityPerCm3: density,
      lengthUm: thicknessUm,
      backgroundDopant: null,
      backgroundDensityPerCm3: null,
    });
    expect(figures.sheetResistanceOhmSq).toBeCloseTo(ohmSq, 1);
    expect(figures.junctionDepthUm).toBe(thicknessUm);
  });
});

describe('resistivity along a crystal of 1e15 at its seed', () => {
  // Scheil's law with the segregation coefficients in general use [1]; ratios [calc].
  it.each<[Dopant, number, number]>([
    ['phosphorus', 0.5, 0.6486],
    ['phosphorus', 0.9, 0.2422],
    ['boron', 0.5, 0.8723],
    ['boron', 0.9, 0.6359],
  ])('falls for %s at g = %s to %s of the seed end', (dopant, fraction, ratio) => {
    const here = standardResistivity(dopant, scheilDensity(dopant, 1e15, fraction));
    expect(here / standardResistivity(dopant, 1e15)).toBeCloseTo(ratio, 4);
  });
});

describe('the segregation coefficients', () => {
  // Values in general use [1].
  it.each<[Dopant, number]>([
    ['boron', 0.8],
    ['phosphorus', 0.35],
    ['arsenic', 0.3],
    ['antimony', 0.023],
  ])('of %s is %s: the crystal holds at half its length 2^(1 − k) of its seed end', (dopant, k) => {
    expect(scheilDensity(dopant, 1e15, 0.5) / 1e15).toBeCloseTo(2 ** (1 - k), 12);
  });
});

describe('the depletion edge of a junction without bias', () => {
  it('takes 1.04 µm of a layer of 1e15 on 1e19, a tenth of 10 µm [calc]', () => {
    expect(depletionWidth(1e15, 1e19)).toBeCloseTo(1.04, 2);
    expect(() => depletionWidth(1e15, 0)).toThrow(RangeError);
  });

  it('reaches the same charge on both sides', () => {
    expect((1e15 * depletionWidth(1e15, 3e16)) / (3e16 * depletionWidth(3e16, 1e15))).toBeCloseTo(1, 12);
  });
});
