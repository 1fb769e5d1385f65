import { describe, expect, it } from 'vitest';
import { coefficientDisagreementPercentPerC } from '@/lib/physics/coefficient-disagreement';
import { standardDensity300K, standardResistivity300K } from '@/lib/physics/standard-conversion-300k';
import { standardResistivity } from '@/lib/physics/standard-resistivity';

// NBS Special Publication 400-64 (1981), the fits at 300 K [1]; all figures [calc].
describe('the standard conversion at 300 K', () => {
  it('lies 2.7 to 3.4 % above that at 23 °C in lightly doped silicon', () => {
    for (let x = 13; x <= 16.001; x += 0.1) {
      for (const dopant of ['boron', 'phosphorus'] as const) {
        const percent =
          100 * (standardResistivity300K(dopant, 10 ** x) / standardResistivity(dopant, 10 ** x) - 1);
        expect(percent).toBeGreaterThan(2.7);
        expect(percent).toBeLessThan(3.4);
      }
    }
  });

  it('has the mobility of light doping that its limits say: 1/(q·N·ρ) of 465 for holes', () => {
    // m = 0.00215 V·s/cm² is 1/µ.
    expect(1 / (1.602e-19 * 1e12 * standardResistivity300K('boron', 1e12))).toBeCloseTo(1 / 0.00215, 0);
  });

  it('closes there and back by the numeric inverse, and misses by up to 2.6 % (boron) and 6.3 % (phosphorus) by the direct one', () => {
    for (const [dopant, top, worst] of [
      ['boron', 20.9, 2.6],
      ['phosphorus', 20.6, 6.3],
    ] as const) {
      let most = 0;
      for (let x = 12.2; x < top; x += 0.01) {
        const resistivity = standardResistivity300K(dopant, 10 ** x);
        expect(standardDensity300K(dopant, resistivity, 'numeric') / 10 ** x).toBeCloseTo(1, 9);
        most = Math.max(
          most,
          Math.abs(standardDensity300K(dopant, resistivity, 'direct') / 10 ** x - 1) * 100,
        );
      }
      expect(most).toBeCloseTo(worst, 1);
    }
  });

  it('is refused outside its range, with the range in the message', () => {
    expect(() => standardResistivity300K('phosphorus', 6e20)).toThrow(/1e\+12 to 5e\+20/);
    expect(() => standardDensity300K('boron', 1e5, 'numeric')).toThrow(RangeError);
    expect(() => standardDensity300K('boron', 1e5, 'direct')).toThrow(/0.0001 to 10000/);
    expect(() => standardDensity300K('boron', Number.NaN, 'numeric')).toThrow(RangeError);
  });
});

// Bullis and others (1968) against NBS SP 400-64 (1981), one laboratory; [1], the second [calc].
describe('two sources of the temperature coefficient', () => {
  it.each([
    [10, 0.8248, 0.7535],
    [100, 0.8757, 0.7436],
  ])('differ for boron of %s Ω·cm: %s against %s %% per °C', (resistivity, bullis, thurber) => {
    const difference = coefficientDisagreementPercentPerC('boron', resistivity) ?? Number.NaN;
    expect(difference).toBeCloseTo(bullis - thurber, 3);
  });

  it('agree for phosphorus from 1 to 100 Ω·cm within 0.025 % per °C', () => {
    for (const resistivity of [1, 3, 10, 30, 100]) {
      expect(Math.abs(coefficientDisagreementPercentPerC('phosphorus', resistivity) ?? 1)).toBeLessThan(
        0.025,
      );
    }
  });

  it('are null where no coefficient is published', () => {
    expect(coefficientDisagreementPercentPerC('boron', 1000)).toBeNull();
    expect(coefficientDisagreementPercentPerC('boron', 5e-4)).toBeNull();
  });
});
