import { describe, expect, it } from 'vitest';
import { densitySensitivity } from '@/lib/physics/density-sensitivity';
import type { Dopant } from '@/lib/physics/dopant';
import { standardDensity } from '@/lib/physics/standard-density';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import type { Target } from '@/lib/physics/target';

// Sources: ASTM F723 / SEMI MF723, after Thurber, Mattis, Liu and Filliben, NBS Special Publication 400-64 (1981).
// [calc]: recomputed from the published fit.

describe('the standard conversion at 23 °C', () => {
  it.each<[Dopant, number, number, number]>([
    ['boron', 1e15, 13.306, 5e-4],
    ['boron', 1e18, 0.04355, 5e-6],
    ['phosphorus', 1e15, 4.4819, 5e-5],
    ['phosphorus', 1e18, 0.02356, 5e-6],
    ['arsenic', 1e20, 9.635e-4, 5e-8],
  ])('gives %s at %s per cm³ its anchor of %s Ω·cm [calc]', (dopant, density, resistivity, half) => {
    expect(Math.abs(standardResistivity(dopant, density) - resistivity)).toBeLessThanOrEqual(half);
  });

  it.each<[Dopant, number, number]>([
    ['boron', 10, 1.34e15],
    ['phosphorus', 10, 4.445e14],
  ])('gives %s of %s Ω·cm the direct fit’s anchor of %s per cm³ [calc]', (dopant, resistivity, density) => {
    expect(standardDensity(dopant, resistivity, 'direct') / density).toBeCloseTo(1, 3);
  });

  // NBS SP 400-64, specimens measured at 23 °C [1]; the fits are stated to hold within 4.5 % (P) and 3 % (B).
  it.each<[Dopant, number, number, number]>([
    ['phosphorus', 158.6, 2.701e13, 4.5],
    ['phosphorus', 9.184, 4.769e14, 4.5],
    ['boron', 0.001707, 6.655e19, 3],
  ])(
    'meets the published %s specimen of %s Ω·cm within its stated accuracy',
    (dopant, ohmCm, density, percent) => {
      expect(Math.abs(standardResistivity(dopant, density) / ohmCm - 1) * 100).toBeLessThan(percent);
      expect(Math.abs(standardDensity(dopant, ohmCm, 'direct') / density - 1) * 100).toBeLessThan(percent);
      expect(Math.abs(standardDensity(dopant, ohmCm, 'numeric') / density - 1) * 100).toBeLessThan(percent);
    },
  );

  it.each<[Dopant, number, number]>([
    ['boron', 21, 2.7],
    ['phosphorus', Math.log10(5e20), 7.1],
  ])(
    'lets the two inverses of %s differ by as much as is published, no more [calc]',
    (dopant, top, percent) => {
      let worst = 0;
      for (let x = 12.15; x < top - 0.05; x += 0.005) {
        const direct = standardDensity(dopant, standardResistivity(dopant, 10 ** x), 'direct');
        worst = Math.max(worst, Math.abs(direct / 10 ** x - 1) * 100);
      }
      expect(worst).toBeCloseTo(percent, 1);
    },
  );

  it.each<Dopant>(['boron', 'phosphorus', 'arsenic', 'antimony'])(
    'turns round for %s as halving by brute force does, and closes to 1e-9 [calc]',
    (dopant) => {
      for (let x = 12.1; x < 18.95; x += 0.37) {
        const resistivity = standardResistivity(dopant, 10 ** x);
        let [low, high] = [1e12, 9.9e18];
        for (let step = 0; step < 200; step++) {
          const middle = Math.sqrt(low * high);
          if (standardResistivity(dopant, middle) > resistivity) low = middle;
          else high = middle;
        }
        expect(standardDensity(dopant, resistivity, 'numeric') / low).toBeCloseTo(1, 9);
        expect(standardDensity(dopant, resistivity, 'numeric') / 10 ** x).toBeCloseTo(1, 9);
      }
    },
  );

  it('says its range, and what to do with lighter silicon', () => {
    expect(() => standardResistivity('boron', 1e11)).toThrow(/from 1e\+12 to 1e\+21.*both carriers/);
    expect(() => standardResistivity('phosphorus', 6e20)).toThrow(/to 5e\+20 per cm³, not 6/);
    expect(() => standardResistivity('antimony', 2e19)).toThrow(/to 1e\+19/);
    expect(() => standardDensity('boron', 2e4, 'direct')).toThrow(/0.0001 to 10000 Ω·cm/);
  });

  it('keeps the step of 3.8 % between phosphorus and arsenic at 1e19 and their 25 % at 1e20 [calc]', () => {
    const at19 = standardResistivity('phosphorus', 1e19) / standardResistivity('arsenic', 1e19);
    expect((1 - 1 / at19) * 100).toBeCloseTo(3.8, 1);
    const at20 = standardResistivity('arsenic', 1e20) / standardResistivity('phosphorus', 1e20);
    expect((at20 - 1) * 100).toBeCloseTo(25, 0);
  });

  it.each<[Dopant, number, number]>([
    ['boron', 1e13, -1],
    ['boron', 1e15, -0.986],
    ['boron', 1e17, -0.755],
    ['boron', 1e18, -0.623],
    ['boron', 1e20, -0.945],
    ['phosphorus', 1e13, -1],
    ['phosphorus', 1e15, -0.965],
    ['phosphorus', 1e17, -0.676],
    ['phosphorus', 1e18, -0.483],
    ['phosphorus', 1e20, -0.878],
  ])('has for %s at %s per cm³ the sensitivity %s [calc]', (dopant, density, slope) => {
    const target: Target = {
      quantity: 'resistivity',
      dopant,
      densityPerCm3: density,
      tolerancePercent: null,
      alongCrystal: false,
      profile: 'uniform',
      lengthUm: null,
      backgroundDopant: null,
      backgroundDensityPerCm3: null,
      calibrationFactor: null,
      calibrationPercent: null,
    };
    expect(Math.abs(densitySensitivity(target, density) - slope)).toBeLessThan(slope === -1 ? 2e-3 : 6e-4);
  });
});
