import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { carriers } from '@/lib/physics/carriers';
import { intrinsicDensity } from '@/lib/physics/intrinsic-density';
import { ionizationTerms } from '@/lib/physics/ionization-terms';
import { ionizedCarriers } from '@/lib/physics/ionized-carriers';
import { ionizedFraction } from '@/lib/physics/ionized-fraction';

const doped = (donorsPerCm3: number, acceptorsPerCm3: number) => ({
  donor: 'phosphorus' as const,
  donorsPerCm3,
  acceptorsPerCm3,
});

describe('carriers where not every dopant is ionized', () => {
  it('balance to 1e-12 of the charges there are, with n·p = ni²', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 8, max: 20, noNaN: true }),
        fc.double({ min: 8, max: 20, noNaN: true }),
        fc.double({ min: 100, max: 340, noNaN: true }),
        (d, a, temperatureK) => {
          const [donors, acceptors] = [10 ** d, 10 ** a];
          const found = ionizedCarriers(doped(donors, acceptors), temperatureK);
          if (found === null) throw new Error('Phosphorus has a set.');
          const { electronsPerCm3: n, holesPerCm3: p } = found;
          const charged = donors * (found.ionizedDonors ?? 0) - acceptors * (found.ionizedAcceptors ?? 0);
          expect(Math.abs(n - p - charged)).toBeLessThan(1e-12 * (n + p + donors + acceptors));
          expect((n * p) / intrinsicDensity(temperatureK) ** 2).toBeCloseTo(1, 10);
        },
      ),
      { seed: 6 },
    );
  });

  it('are those of the closed form where one dopant stands alone', () => {
    for (const density of [1e14, 1e16, 1e18, 1e20]) {
      const share = ionizedFraction('phosphorus', density, 300) ?? 0;
      expect(ionizedCarriers(doped(density, 0), 300)?.ionizedDonors).toBeCloseTo(share, 7);
      expect(ionizedCarriers(doped(0, density), 300)?.ionizedAcceptors).toBeCloseTo(
        ionizedFraction('boron', density, 300) ?? 0,
        7,
      );
    }
  });

  it('agree with halving by brute force in compensated silicon', () => {
    const [donors, acceptors, ni] = [9e17, 1e18, intrinsicDensity(300)];
    const ofDonors = ionizationTerms('phosphorus', donors, 300);
    const ofAcceptors = ionizationTerms('boron', acceptors, 300);
    if (ofDonors === null || ofAcceptors === null) throw new Error('Both have a set.');
    let [low, high] = [1, 1e19];
    for (let step = 0; step < 300; step++) {
      const p = (low + high) / 2;
      const n = ni ** 2 / p;
      const plus = donors * (1 - (ofDonors.bound * n) / (n + ofDonors.levelPerCm3));
      const minus = acceptors * (1 - (ofAcceptors.bound * p) / (p + ofAcceptors.levelPerCm3));
      if (p + plus > n + minus) high = p;
      else low = p;
    }
    expect((ionizedCarriers(doped(donors, acceptors), 300)?.holesPerCm3 ?? 0) / low).toBeCloseTo(1, 9);
  });

  it('are the fully ionized ones in light doping, and intrinsic without any', () => {
    const all = carriers(1e13, 0, 300).electronsPerCm3;
    expect((ionizedCarriers(doped(1e13, 0), 300)?.electronsPerCm3 ?? 0) / all).toBeCloseTo(1, 4);
    const pure = ionizedCarriers(doped(0, 0), 300);
    expect((pure?.electronsPerCm3 ?? 0) / intrinsicDensity(300)).toBeCloseTo(1, 12);
    expect(pure?.ionizedDonors).toBeNull();
  });

  it('are unknown for antimony, and refused for negative densities', () => {
    expect(ionizedCarriers({ ...doped(1e17, 0), donor: 'antimony' }, 300)).toBeNull();
    expect(() => ionizedCarriers(doped(-1, 0), 300)).toThrow(RangeError);
    expect(() => ionizedCarriers(doped(1e15, 0), 400)).toThrow(RangeError);
  });
});
