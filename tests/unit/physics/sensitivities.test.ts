import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { densitySensitivity } from '@/lib/physics/density-sensitivity';
import { depletionSensitivity, depletionWidth } from '@/lib/physics/depletion-width';
import { dopantPercent } from '@/lib/physics/dopant-percent';
import { dopantScalePercent } from '@/lib/physics/dopant-scale-percent';
import { DOPANTS } from '@/lib/physics/dopant';
import { expectedValue } from '@/lib/physics/expected-value';
import { modelValue } from '@/lib/physics/model-value';
import { sensitivities } from '@/lib/physics/sensitivities';
import { standardDensityLimits } from '@/lib/physics/standard-density-limits';
import { standardRange } from '@/lib/physics/standard-range';
import { standardResistivity, standardSensitivity } from '@/lib/physics/standard-resistivity';
import type { Target } from '@/lib/physics/target';
import { valueAtTemperature } from '@/lib/physics/value-at-temperature';
import { BORON, DRIVEN, EPI, ERFC, GAUSSIAN, IMPLANT, PAIRS } from './targets';

/** d ln f/d ln x by a central difference: the independent way. */
function logSlope(f: (x: number) => number, x: number, step = 1e-4): number {
  return Math.log(f(x * (1 + step)) / f(x * (1 - step))) / Math.log((1 + step) / (1 - step));
}

const named = { BORON, GAUSSIAN, ERFC, IMPLANT, DRIVEN, EPI, PAIRS };
const targets = Object.entries(named);

describe('the slope of the standard conversion', () => {
  it('is that of a central difference, for every dopant over its whole range', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...DOPANTS),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (dopant, share) => {
          const { lowerPerCm3, upperPerCm3 } = standardDensityLimits(dopant);
          const density = lowerPerCm3 * 1.001 * (upperPerCm3 / lowerPerCm3 / 1.003) ** share;
          // On one side of arsenic's step.
          fc.pre(standardRange(dopant, density * 0.999)?.fit === standardRange(dopant, density * 1.001)?.fit);
          const numeric = logSlope((n) => standardResistivity(dopant, n), density);
          expect(standardSensitivity(dopant, density)).toBeCloseTo(numeric, 5);
        },
      ),
      { seed: 7 },
    );
  });

  it('is negative everywhere: more dopant never raises a resistivity', () => {
    for (const dopant of DOPANTS) {
      const { lowerPerCm3, upperPerCm3 } = standardDensityLimits(dopant);
      for (let density = lowerPerCm3; density <= upperPerCm3; density *= 1.02) {
        expect(standardSensitivity(dopant, density)).toBeLessThan(0);
      }
    }
  });
});

describe('what a percent of dopant does to a value', () => {
  it.each(targets)('is for %s what a central difference says', (_, target) => {
    const numeric = logSlope((n) => modelValue(target, n), target.densityPerCm3);
    expect(densitySensitivity(target, target.densityPerCm3)).toBeCloseTo(numeric, 6);
  });

  it('is more than the doping’s own for a grown layer: the depleted part shrinks as well', () => {
    const own = standardSensitivity('phosphorus', 1e15);
    expect(densitySensitivity(EPI, 1e15)).toBeLessThan(own - 0.05);
    expect(densitySensitivity({ ...EPI, lengthUm: 1e4 }, 1e15)).toBeCloseTo(own, 3);
    expect(depletionSensitivity(1e15, 1e19)).toBeCloseTo(
      logSlope((n) => depletionWidth(n, 1e19), 1e15),
      7,
    );
  });
});

describe('what moves a value', () => {
  it('counts thickness with a minus for a sheet, with a plus for a resistivity computed from it', () => {
    expect(sensitivities(BORON).perPercentThickness).toBe(1);
    expect(sensitivities({ ...GAUSSIAN, profile: 'box' }).perPercentThickness).toBe(-1);
    expect(sensitivities(IMPLANT).perPercentThickness).toBeNull();
    const numeric = logSlope((t) => modelValue(EPI, 1e15, { layerThicknessUm: t }), 10);
    expect(sensitivities(EPI).perPercentThickness).toBeCloseTo(numeric, 7);
    expect(sensitivities(EPI, { layerThicknessUm: 3 }).perPercentThickness).toBeLessThan(-1.5);
  });

  it('stretches a gaussian or erfc exactly: a percent of length is a percent of sheet resistance', () => {
    for (const target of [GAUSSIAN, ERFC]) {
      const numeric = logSlope(
        (lengthUm) => modelValue({ ...target, lengthUm }, target.densityPerCm3),
        target.lengthUm ?? 0,
      );
      expect(sensitivities(target).perPercentThickness).toBeCloseTo(numeric, 8);
    }
  });

  it('knows what a °C of the drive-in does, and nothing of it where there is none', () => {
    expect(sensitivities(IMPLANT).perDriveInC).toBeNull();
    const at = (driveInC: number): number =>
      Math.log(modelValue({ ...DRIVEN, driveInC }, DRIVEN.densityPerCm3));
    expect(sensitivities(DRIVEN).perDriveInC).toBeCloseTo((100 * (at(1000.05) - at(999.95))) / 0.1, 5);
  });

  it.each(targets)('knows what a °C at the measurement does to %s', (_, target) => {
    const value = modelValue(target, target.densityPerCm3);
    const at = (celsius: number): number => Math.log(valueAtTemperature(target, value, celsius));
    expect(sensitivities(target).perMeasurementC).toBeCloseTo((100 * (at(23.01) - at(22.99))) / 0.02, 3);
  });

  it('says null of the temperature where no coefficient is published', () => {
    expect(sensitivities({ ...BORON, densityPerCm3: 1e12 }).perMeasurementC).toBeNull();
  });
});

describe('the one scale of a tool', () => {
  it('reads a step of the dose alike on every product, whatever its doping', () => {
    for (const target of [BORON, { ...BORON, densityPerCm3: 1e18 }, GAUSSIAN, ERFC, IMPLANT]) {
      const { value, sensitivity } = expectedValue(target);
      const stepped = modelValue(target, target.densityPerCm3 * 1.01);
      expect(dopantScalePercent(stepped / value, sensitivity)).toBeCloseTo(1, 1);
    }
  });

  it('is the dopant in percent for small differences, and adds up', () => {
    expect(dopantScalePercent(1.0001, -0.7)).toBeCloseTo(dopantPercent(1.0001, -0.7) ?? 0, 4);
    const [one, two] = [dopantScalePercent(0.97, -0.7), dopantScalePercent(0.95, -0.7)];
    expect(dopantScalePercent(0.97 * 0.95, -0.7)).toBeCloseTo(one + two, 12);
    expect(dopantScalePercent(0.98, -0.5)).toBeCloseTo(4.0405, 4);
    expect(Object.is(dopantScalePercent(1, -1), 0)).toBe(true);
  });

  it('refuses ratios and sensitivities that cannot be', () => {
    for (const [ratio, sensitivity] of [
      [0, -1],
      [-1, -1],
      [Infinity, -1],
      [1, 0],
      [1, Number.NaN],
      [2, 1e-320],
    ] as const) {
      expect(() => dopantScalePercent(ratio, sensitivity)).toThrow(RangeError);
    }
  });
});

describe('a drive-in beyond the classical law', () => {
  const heavy: Target = { ...DRIVEN, densityPerCm3: 1e20 };

  it('is an order of magnitude only: no expected value, and the message says why', () => {
    expect(modelValue(heavy, 1e20)).toBeGreaterThan(0);
    expect(() => expectedValue(heavy)).toThrow(/order of magnitude/);
    expect(() => expectedValue({ ...heavy, calibrationFactor: 1.1 })).toThrow(/order of magnitude/);
  });

  it('is known through a calibration with its own uncertainty', () => {
    const expected = expectedValue({ ...heavy, calibrationFactor: 1.1, calibrationPercent: 0.5 });
    expect(expected.uncertaintyPercent).toBe(0.5);
    expect(expected.notes.join(' ')).toMatch(/order of magnitude/);
  });

  it('needs both temperature and time, and an implant', () => {
    expect(() => expectedValue({ ...IMPLANT, driveInC: 1000 })).toThrow(/both/);
    expect(() => expectedValue({ ...GAUSSIAN, driveInC: 1000, driveInMin: 3 })).toThrow(
      /belongs to an implant/,
    );
    expect(() => expectedValue({ ...IMPLANT, rangeUm: null })).toThrow(/projected range/);
    expect(() => expectedValue({ ...PAIRS, pairs: null })).toThrow(/depths and densities/);
  });
});
