import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { adaptiveIntegral } from '@/lib/physics/adaptive-integral';
import { carriers } from '@/lib/physics/carriers';
import { complementaryErrorFunction } from '@/lib/physics/complementary-error-function';
import { conductionResistivity } from '@/lib/physics/conduction-resistivity';
import { klaassenMobility } from '@/lib/physics/klaassen-mobility';
import { masettiMobility } from '@/lib/physics/masetti-mobility';
import { mobilityNotes } from '@/lib/physics/mobility-notes';
import { monotoneRoot } from '@/lib/physics/monotone-root';
import { polynomial } from '@/lib/physics/polynomial';
import { polynomialSlope } from '@/lib/physics/polynomial-slope';
import { resistivityAtTemperature } from '@/lib/physics/resistivity-at-temperature';
import { scheilDensity } from '@/lib/physics/scheil-density';
import { resistivityAt23C } from '@/lib/physics/temperature-coefficient';

describe('charge neutrality', () => {
  it('keeps n·p at ni² and n − p at the net doping, however unequal they are', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 8, max: 20, noNaN: true }),
        fc.double({ min: 8, max: 20, noNaN: true }),
        (donors, acceptors) => {
          const { electronsPerCm3: n, holesPerCm3: p } = carriers(10 ** donors, 10 ** acceptors, 300);
          const intrinsic = carriers(0, 0, 300).electronsPerCm3;
          expect((n * p) / intrinsic ** 2).toBeCloseTo(1, 12);
          expect(Math.abs(n - p - (10 ** donors - 10 ** acceptors))).toBeLessThan(1e-12 * (n + p));
        },
      ),
      { seed: 3 },
    );
  });

  it('refuses negative densities and temperatures without a published ni', () => {
    expect(() => carriers(-1, 0, 300)).toThrow(RangeError);
    expect(() => carriers(0, 0, 400)).toThrow(RangeError);
  });
});

describe('the mobility models', () => {
  it('fall with doping for the majority carriers', () => {
    let before = Infinity;
    for (let x = 13; x <= 20; x += 0.25) {
      const mobility = klaassenMobility(
        'hole',
        {
          donor: 'phosphorus',
          donorsPerCm3: 0,
          acceptorsPerCm3: 10 ** x,
          electronsPerCm3: 1,
          holesPerCm3: 10 ** x,
        },
        300,
      );
      expect(mobility).toBeLessThan(before);
      before = mobility;
    }
  });

  it('of Klaassen is continuous where its minority factor is held at its least', () => {
    // Electrons among acceptors: P falls with doping and meets the factor's minimum on the way.
    const at = (density: number): number =>
      klaassenMobility(
        'electron',
        {
          donor: 'phosphorus',
          donorsPerCm3: 0,
          acceptorsPerCm3: density,
          electronsPerCm3: 1,
          holesPerCm3: density,
        },
        300,
      );
    for (let x = 17; x < 20.9; x += 0.002) {
      expect(Math.abs(Math.log(at(10 ** (x + 0.002)) / at(10 ** x)))).toBeLessThan(0.01);
    }
  });

  it('let phosphorus stand in for antimony, and say so', () => {
    expect(() => masettiMobility('antimony', 1e17)).toThrow(RangeError);
    const doping = { donor: 'antimony' as const, donorsPerCm3: 1e17, acceptorsPerCm3: 0 };
    for (const model of ['masetti', 'klaassen'] as const) {
      const phosphorus = conductionResistivity(model, { ...doping, donor: 'phosphorus' }, 300);
      expect(conductionResistivity(model, doping, 300)).toBe(phosphorus);
      expect(mobilityNotes(model, doping).join(' ')).toMatch(/phosphorus stands in/);
      expect(mobilityNotes(model, { ...doping, donor: 'arsenic' }).join(' ')).not.toMatch(/stands in, with/);
    }
    expect(mobilityNotes('arora', doping).join(' ')).toMatch(/nothing is published/);
  });

  it('refuse the temperatures they do not hold at', () => {
    const doping = { donor: 'antimony' as const, donorsPerCm3: 1e17, acceptorsPerCm3: 0 };
    expect(() => conductionResistivity('masetti', { ...doping, donor: 'arsenic' }, 296.15)).toThrow(/300 K/);
    expect(conductionResistivity('arora', doping, 300)).toBeGreaterThan(0);
  });
});

describe('resistivity at another temperature', () => {
  it('leads back to 23 °C by the published coefficient', () => {
    for (const temperatureC of [18, 20, 25, 28]) {
      const there = resistivityAtTemperature('phosphorus', 4.445e14, 10, temperatureC);
      expect(resistivityAt23C('n', there, temperatureC)).toBeCloseTo(10, 10);
    }
  });

  it('goes on beyond 28 °C with the model, within two percent of the coefficient’s line', () => {
    const inside = resistivityAtTemperature('boron', 1.34e15, 10, 28);
    expect(resistivityAtTemperature('boron', 1.34e15, 10, 28.01) / inside).toBeCloseTo(1, 1);
    expect(() => resistivityAtTemperature('boron', 1.34e15, 10, 90)).toThrow(RangeError);
  });
});

describe('numerical tools', () => {
  it('erfc has its tabulated values deep into the tail', () => {
    // Abramowitz and Stegun (1964), table 7.1 (memory); erfc(5) 1.537459794428035e-12 (memory).
    expect(complementaryErrorFunction(0)).toBe(1);
    expect(complementaryErrorFunction(0.5)).toBeCloseTo(0.4795001222, 10);
    expect(complementaryErrorFunction(5) / 1.537459794428035e-12).toBeCloseTo(1, 12);
    expect(complementaryErrorFunction(2 - 1e-12) / complementaryErrorFunction(2)).toBeCloseTo(1, 10);
    expect(() => complementaryErrorFunction(-1)).toThrow(RangeError);
  });

  it('the slope of a polynomial is that of its terms', () => {
    expect(polynomialSlope([1, 2, 3], 2)).toBe(14);
    expect(polynomialSlope([5], 2)).toBe(0);
    expect(polynomial([1, 2, 3], 2)).toBe(17);
    expect(polynomial([], 2)).toBe(0);
  });

  it('the integral of a known function is exact, also over a step', () => {
    expect(adaptiveIntegral(Math.exp, 0, 1, 1e-10)).toBeCloseTo(Math.E - 1, 12);
    const spike = adaptiveIntegral((x) => Math.exp(-(((x - 0.3) / 0.01) ** 2)), 0, 1, 1e-9);
    expect(spike / (0.01 * Math.sqrt(Math.PI))).toBeCloseTo(1, 9);
    // The 15-point rule is exact for every power up to the 22nd.
    for (let power = 0; power <= 22; power++) {
      expect((power + 1) * adaptiveIntegral((x) => x ** power, 0, 1, 1)).toBeCloseTo(1, 13);
    }
    expect(adaptiveIntegral((x) => (x < 0.3 ? 1 : 3), 0, 1, 1e-9)).toBeCloseTo(2.4, 7);
    expect(() => adaptiveIntegral(Math.exp, 0, Infinity, 1e-9)).toThrow(RangeError);
  });

  it('the root of a bracketed function is found, and none is said to be there without a change of sign', () => {
    expect(monotoneRoot((x) => x * x - 2, 0, 2, 1e-13)).toBeCloseTo(Math.SQRT2, 12);
    expect(monotoneRoot((x) => Math.exp(20 * x) - 2, -5, 5, 1e-12)).toBeCloseTo(Math.LN2 / 20, 11);
    expect(monotoneRoot((x) => x, 0, 1, 1e-9)).toBe(0);
    expect(monotoneRoot((x) => x + 2, 0, 1, 1e-9)).toBeNull();
    expect(() => monotoneRoot((x) => x, 1, 0, 1e-9)).toThrow(RangeError);
  });

  it('a crystal’s fraction stays below one', () => {
    expect(scheilDensity('phosphorus', 1e15, 0.5) / 1.569e15).toBeCloseTo(1, 3);
    expect(scheilDensity('boron', 1e15, 0)).toBe(1e15);
    expect(() => scheilDensity('boron', 1e15, 1)).toThrow(RangeError);
    expect(() => scheilDensity('boron', 0, 0.5)).toThrow(RangeError);
  });
});
