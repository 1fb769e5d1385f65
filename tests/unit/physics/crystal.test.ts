import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { codopedPlace, typeChangeFraction, type MeltDopant } from '@/lib/physics/codoped-crystal';
import { conductionResistivity } from '@/lib/physics/conduction-resistivity';
import { crystalCurve } from '@/lib/physics/crystal-curve';
import { SEGREGATION_COEFFICIENT } from '@/lib/physics/scheil-density';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

const melt = (boron: number, phosphorus: number): MeltDopant[] => [
  { dopant: 'boron', seedDensityPerCm3: boron },
  { dopant: 'phosphorus', seedDensityPerCm3: phosphorus },
];

describe('a crystal from a melt of two dopants', () => {
  it('changes type where Scheil’s law says: (1 − g)^(kB − kP) = NP/NB [calc]', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 0.99, noNaN: true }), (share) => {
        const { boron, phosphorus } = SEGREGATION_COEFFICIENT;
        const closed = 1 - share ** (1 / (boron - phosphorus));
        const fraction = typeChangeFraction(melt(1e16, 1e16 * share)) ?? Number.NaN;
        expect(fraction).toBeCloseTo(closed, 10);
      }),
      { seed: 4 },
    );
    // By the same formula: 1 − 0.5^(1/0.45).
    expect(typeChangeFraction(melt(1e16, 5e15))).toBeCloseTo(0.7857, 4);
  });

  it('is p-type before the crossing and n-type after it', () => {
    const both = melt(1e16, 5e15);
    const at = typeChangeFraction(both) ?? Number.NaN;
    expect(codopedPlace(both, at - 1e-6).type).toBe('p');
    expect(codopedPlace(both, at + 1e-6).type).toBe('n');
  });

  it('never changes where one type leads from the seed on, or stands alone', () => {
    expect(typeChangeFraction(melt(1e15, 1e16))).toBeNull();
    expect(typeChangeFraction([{ dopant: 'boron', seedDensityPerCm3: 1e15 }])).toBeNull();
  });

  it('adds donors of several kinds, each by its own segregation', () => {
    const three: MeltDopant[] = [...melt(1e16, 2e15), { dopant: 'arsenic', seedDensityPerCm3: 2e15 }];
    const place = codopedPlace(three, 0.6);
    const donors = 2e15 * 0.4 ** (0.35 - 1) + 2e15 * 0.4 ** (0.3 - 1);
    expect(place.donorsPerCm3 / donors).toBeCloseTo(1, 12);
    expect(place.donor).toBe('arsenic');
    const turn = typeChangeFraction(three) ?? Number.NaN;
    expect(codopedPlace(three, turn).netDensityPerCm3).toBeLessThan(1e5);
  });

  it('has a resistivity that peaks where it turns, by both carriers at the total doping', () => {
    const both = melt(1e16, 5e15);
    const turn = typeChangeFraction(both) ?? Number.NaN;
    const curve = crystalCurve(both, [0, 0.5, turn, 0.9], 'masetti').map(
      ({ resistivityOhmCm }) => resistivityOhmCm ?? 0,
    );
    expect(Math.max(...curve)).toBe(curve[2]);
    // Fully compensated: above intrinsic, as nothing but impurities is added.
    expect(curve[2]).toBeGreaterThan(3.2e5);
    expect(curve[1]).toBe(conductionResistivity('masetti', codopedPlace(both, 0.5), 300));
  });

  it('of one dopant follows the standard conversion, and says null beyond it', () => {
    const [seed, half, end] = crystalCurve(
      [{ dopant: 'phosphorus', seedDensityPerCm3: 1e15 }],
      [0, 0.5, 1 - 1e-12],
      'masetti',
    );
    expect(seed?.resistivityOhmCm).toBe(standardResistivity('phosphorus', 1e15));
    // Scheil, k = 0.35 [calc]: 0.6486 of the seed end.
    expect((half?.resistivityOhmCm ?? 0) / (seed?.resistivityOhmCm ?? 1)).toBeCloseTo(0.6486, 4);
    expect(end?.resistivityOhmCm).toBeNull();
    expect(
      crystalCurve([{ dopant: 'phosphorus', seedDensityPerCm3: 1e11 }], [0], 'masetti')[0]?.resistivityOhmCm,
    ).toBeNull();
  });

  it('refuses a melt of nothing and a fraction beyond the crystal', () => {
    expect(() => codopedPlace([], 0)).toThrow(RangeError);
    expect(() => codopedPlace(melt(1e15, 1e15), 1)).toThrow(RangeError);
  });
});
