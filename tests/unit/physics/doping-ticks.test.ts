import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dopingTicks } from '@/lib/physics/doping-ticks';
import { expectedValue } from '@/lib/physics/expected-value';
import type { Target } from '@/lib/physics/target';

const target: Target = {
  quantity: 'resistivity',
  dopant: 'phosphorus',
  densityPerCm3: 1e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};

describe('the doping scale', () => {
  it('puts round densities where physics expects them, inside the axis', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -3, max: 3, noNaN: true }),
        fc.double({ min: 0.005, max: 3, noNaN: true }),
        fc.integer({ min: 2, max: 10 }),
        (decade, span, count) => {
          const [lower, upper] = [10 ** decade, 10 ** (decade + span)];
          const ticks = dopingTicks(target, lower, upper, count);
          expect(ticks.length).toBeLessThanOrEqual(3 * count + 3);
          let before = 0;
          for (const { densityPerCm3, value } of ticks) {
            expect(densityPerCm3).toBeGreaterThan(before);
            before = densityPerCm3;
            expect(value).toBe(expectedValue({ ...target, densityPerCm3 }).value);
            expect(value).toBeGreaterThanOrEqual(lower);
            expect(value).toBeLessThanOrEqual(upper);
          }
        },
      ),
      { seed: 7, numRuns: 200 },
    );
  });

  it('steps by 1e13 over three percent around 1e15 per cm³', () => {
    const ticks = dopingTicks(target, 4.42, 4.55, 4);
    expect(ticks.map((t) => t.densityPerCm3)).toEqual([0.99e15, 1e15, 1.01e15]);
  });

  it('moves with the calibration factor', () => {
    const plain = dopingTicks(target, 4, 5, 5);
    const calibrated = dopingTicks({ ...target, calibrationFactor: 2 }, 8, 10, 5);
    expect(calibrated.map((t) => t.densityPerCm3)).toEqual(plain.map((t) => t.densityPerCm3));
  });

  it('is empty where the axis lies outside the conversion, and refuses a falling axis', () => {
    expect(dopingTicks(target, 1e5, 1e6, 5)).toEqual([]);
    expect(dopingTicks(target, 1e-7, 1e-6, 5)).toEqual([]);
    expect(() => dopingTicks(target, 2, 1, 5)).toThrow(RangeError);
    expect(() => dopingTicks(target, 1, 2, 0)).toThrow(RangeError);
  });
});
