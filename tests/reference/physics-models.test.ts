import { describe, expect, it } from 'vitest';
import { aroraMobility } from '@/lib/physics/arora-mobility';
import { conductionResistivity, type MobilityModel } from '@/lib/physics/conduction-resistivity';
import { intrinsicDensity } from '@/lib/physics/intrinsic-density';
import { ionizationTerms } from '@/lib/physics/ionization-terms';
import { ionizedFraction } from '@/lib/physics/ionized-fraction';
import { klaassenMobility } from '@/lib/physics/klaassen-mobility';
import { masettiMobility } from '@/lib/physics/masetti-mobility';
import { modelSpreadPercent } from '@/lib/physics/model-spread';
import { standardResistivity300K } from '@/lib/physics/standard-conversion-300k';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

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

/** Lowest and highest difference of a model's resistivity at 300 K from a conversion over 1e13…1e20, in percent. */
function extremes(
  model: MobilityModel,
  dopant: 'boron' | 'phosphorus',
  conversion: (dopant: 'boron' | 'phosphorus', densityPerCm3: number) => number,
): [number, number] {
  let [lowest, highest] = [Infinity, -Infinity];
  for (let step = 0; step <= 700; step++) {
    const density = 10 ** (13 + step / 100);
    const silicon = dopant === 'boron' ? doped(0, density) : doped(density, 0);
    const percent = 100 * (conductionResistivity(model, silicon, 300) / conversion(dopant, density) - 1);
    lowest = Math.min(lowest, percent);
    highest = Math.max(highest, percent);
  }
  return [lowest, highest];
}

// Masetti (1983), Arora (1982), Klaassen (1992) against ASTM F723 / NBS SP 400-64 (1981); all [calc].
describe('the mobility models at 300 K against the standard over 1e13 to 1e20', () => {
  it.each<[MobilityModel, 'boron' | 'phosphorus', number, number]>([
    ['masetti', 'boron', -10.6, 7.1],
    ['masetti', 'phosphorus', -9.2, 10.7],
    ['arora', 'boron', -6.8, 4],
    ['arora', 'phosphorus', -11.4, 9.6],
    ['klaassen', 'boron', -6.3, 8.3],
    ['klaassen', 'phosphorus', -9.2, 10.1],
  ])('%s reads for %s from %s to %s percent off the conversion at 23 °C', (model, dopant, low, high) => {
    const [lowest, highest] = extremes(model, dopant, standardResistivity);
    expect(lowest).toBeCloseTo(low, 1);
    expect(highest).toBeCloseTo(high, 1);
  });

  it.each<[MobilityModel, 'boron' | 'phosphorus', number, number]>([
    ['masetti', 'boron', -11, 6.2],
    ['masetti', 'phosphorus', -9, 10.1],
    ['arora', 'boron', -8.7, 4],
    ['arora', 'phosphorus', -11.9, 6.1],
    ['klaassen', 'boron', -6.8, 7.4],
    ['klaassen', 'phosphorus', -9, 9.5],
  ])(
    '%s reads for %s from %s to %s percent off the fits at its own 300 K, the larger being its stated spread',
    (model, dopant, low, high) => {
      const [lowest, highest] = extremes(model, dopant, standardResistivity300K);
      expect(Math.abs(lowest - low)).toBeLessThan(0.06);
      expect(Math.abs(highest - high)).toBeLessThan(0.06);
      expect(modelSpreadPercent(model, dopant)).toBeCloseTo(Math.max(-lowest, highest), 1);
    },
  );

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

  // Green, J. Appl. Phys. 67, 2944 (1990) [1].
  it('rests on the band densities 2.86e19 and 3.10e19 at 300 K, with powers 1.58 and 1.85 of the temperature', () => {
    const k = 8.617333262e-5;
    const band = (dopant: 'boron' | 'phosphorus', kelvin: number): number => {
      const [degeneracy, ev] = dopant === 'boron' ? [1 / 4, 0.04439] : [1 / 2, 0.0455];
      const terms = ionizationTerms(dopant, 1e10, kelvin);
      return (terms?.levelPerCm3 ?? 0) / degeneracy / Math.exp(-ev / (k * kelvin));
    };
    expect(band('phosphorus', 300) / 2.86e19).toBeCloseTo(1, 6);
    expect(band('boron', 300) / 3.1e19).toBeCloseTo(1, 6);
    expect(Math.log2(band('phosphorus', 400) / band('phosphorus', 200))).toBeCloseTo(1.58, 6);
    expect(Math.log2(band('boron', 400) / band('boron', 200))).toBeCloseTo(1.85, 6);
  });

  it('is one in lightly doped silicon, and unknown for antimony', () => {
    expect(ionizedFraction('phosphorus', 1e13, 300)).toBeCloseTo(1, 4);
    expect(ionizedFraction('antimony', 1e18, 300)).toBeNull();
    expect(() => ionizedFraction('boron', 0, 300)).toThrow(RangeError);
  });
});
