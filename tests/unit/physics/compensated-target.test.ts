import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { againstExpected } from '@/lib/physics/against-expected';
import { conductionResistivity } from '@/lib/physics/conduction-resistivity';
import { densityFromMeasured } from '@/lib/physics/density-from-measured';
import { dopingTicks } from '@/lib/physics/doping-ticks';
import { expectedBudget } from '@/lib/physics/expected-uncertainty';
import { expectedValue } from '@/lib/physics/expected-value';
import { modelResistivity } from '@/lib/physics/model-resistivity';
import { sensitivities } from '@/lib/physics/sensitivities';
import type { Target } from '@/lib/physics/target';
import { valueAt23C, valueAtTemperature } from '@/lib/physics/value-at-temperature';
import { BORON, GAUSSIAN } from './targets';

const compensated: Target = {
  ...BORON,
  densityPerCm3: 1e17,
  counterDopant: 'phosphorus',
  counterDensityPerCm3: 9e16,
};
/** p-type to 0.786 of the crystal, n-type after it. */
const crystal: Target = {
  ...compensated,
  densityPerCm3: 1e16,
  counterDensityPerCm3: 5e15,
  alongCrystal: true,
};

describe('the expected value of compensated silicon', () => {
  it('counts both dopants: 2.258 Ω·cm at 300 K (Masetti) where the net doping alone would say 1.44 [calc]', () => {
    const doping = { donor: 'phosphorus' as const, donorsPerCm3: 9e16, acceptorsPerCm3: 1e17 };
    expect(modelResistivity('masetti', doping, 26.85)).toBeCloseTo(2.258, 3);
    expect(modelResistivity('arora', doping, 23)).toBe(conductionResistivity('arora', doping, 296.15));
    const expected = expectedValue(compensated);
    expect(expected.value).toBe(modelResistivity('masetti', doping, 23));
    expect(expected.model).toBe('masetti');
    expect(expected.notes.join(' ')).toMatch(/partly cancel/);
  });

  it('is known as well as the model, not as the standard', () => {
    expect(expectedBudget(compensated).parts.map(({ name }) => name)).toEqual(['masetti model']);
    expect(expectedValue(compensated).uncertaintyPercent).toBeCloseTo(11 / Math.sqrt(3), 10);
  });

  it('answers to a percent of dopant many times over, downwards or upwards by which one leads', () => {
    expect(expectedValue(compensated).sensitivity).toBeLessThan(-5);
    const led = expectedValue({ ...compensated, densityPerCm3: 8e16, tolerancePercent: 5 });
    expect(led.sensitivity).toBeGreaterThan(3);
    expect(led.toleranceLower ?? 0).toBeLessThan(led.value);
    expect(led.toleranceUpper ?? 0).toBeGreaterThan(led.value);
  });

  it('closes the circle with the density from a measured value, on either side', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.2, max: 5, noNaN: true }), (share) => {
        fc.pre(Math.abs(share - 1) > 0.01);
        const target = { ...compensated, densityPerCm3: 9e16 * share };
        const back = densityFromMeasured(target, expectedValue(target).value) ?? Number.NaN;
        expect(back / target.densityPerCm3).toBeCloseTo(1, 9);
        expect(againstExpected(target, expectedValue(target).value)?.dopantPercent).toBeCloseTo(0, 6);
      }),
      { seed: 9, numRuns: 40 },
    );
  });

  it('follows a crystal through its change of type, each dopant by its own segregation', () => {
    const at = (ingotFraction: number) => expectedValue(crystal, { ingotFraction });
    expect(at(0).sensitivity).toBeLessThan(0);
    expect(at(0.75).value).toBeGreaterThan(at(0.5).value);
    expect(at(0.85).sensitivity).toBeGreaterThan(0);
    expect(at(0.95).value).toBeLessThan(at(0.85).value);
    expect(() => at(0.7857)).toThrow(/cancel/);
    expect(densityFromMeasured(crystal, 10)).toBeNull();
  });

  it('moves with the temperature by the ratio of the model, there and back', () => {
    for (const celsius of [-10, 20, 25, 50]) {
      const there = valueAtTemperature(compensated, 2.2, celsius);
      expect(valueAt23C(compensated, there, celsius)).toBeCloseTo(2.2, 9);
    }
    expect(sensitivities(compensated).perMeasurementC).toBeGreaterThan(0.2);
  });

  it('has a doping scale only where more dopant reads lower, the same for every wafer', () => {
    const { value } = expectedValue(compensated);
    const ticks = dopingTicks(compensated, value * 0.9, value * 1.1, 4);
    expect(ticks.length).toBeGreaterThan(1);
    expect(dopingTicks({ ...compensated, densityPerCm3: 5e16 }, 0.1, 10, 4)).toEqual([]);
    expect(dopingTicks(crystal, 0.1, 10, 4)).toEqual([]);
  });

  it('is refused where it makes no sense', () => {
    expect(() => expectedValue({ ...compensated, counterDopant: null })).toThrow(/both/);
    expect(() => expectedValue({ ...compensated, dopant: 'arsenic' })).toThrow(/same type/);
    expect(() => expectedValue({ ...compensated, counterDensityPerCm3: 1e17 })).toThrow(/cancel/);
    expect(() => expectedValue({ ...compensated, densityPerCm3: 2e21 })).toThrow(RangeError);
    const layer = {
      ...GAUSSIAN,
      profile: 'uniform' as const,
      counterDopant: 'arsenic' as const,
      counterDensityPerCm3: 1e14,
    };
    expect(() => expectedValue(layer)).toThrow(/uniform silicon/);
  });
});
