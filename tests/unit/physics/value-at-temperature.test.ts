import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layerCoefficient, layerTemperatureRatio } from '@/lib/physics/layer-temperature';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { resistivityAtTemperature, temperatureStepPercent } from '@/lib/physics/resistivity-at-temperature';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { temperatureCoefficientPercentPerC } from '@/lib/physics/temperature-coefficient';
import { valueAt23C, valueAtTemperature } from '@/lib/physics/value-at-temperature';
import { BORON, DRIVEN, EPI, ERFC, GAUSSIAN } from './targets';

describe('a value at another temperature', () => {
  it('leads back to 23 °C to 1e-9, near and far, for every kind of target', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(BORON, GAUSSIAN, ERFC, DRIVEN, EPI, {
          ...GAUSSIAN,
          temperatureCoefficientPercentPerC: 0.12,
        }),
        fc.double({ min: -20, max: 65, noNaN: true }),
        (target, celsius) => {
          const isNear = celsius >= 18 && celsius <= 28;
          fc.pre(isNear || !('temperatureCoefficientPercentPerC' in target));
          const there = valueAtTemperature(target, 12, celsius);
          expect(valueAt23C(target, there, celsius) / 12).toBeCloseTo(1, 9);
        },
      ),
      { seed: 8, numRuns: 60 },
    );
  });

  it('goes near 23 °C by the coefficient of the resistivity measured (ASTM F84), not of the one aimed at', () => {
    const warm = 10 * (1 - 0.02 * temperatureCoefficientPercentPerC('p', 10));
    expect(valueAt23C({ ...BORON, densityPerCm3: 1e17 }, 10, 25)).toBeCloseTo(warm, 10);
    expect(valueAt23C(BORON, 10, 23)).toBe(10);
  });

  it('goes by the owner’s coefficient where there is one, and no further than 18 to 28 °C', () => {
    const own = { ...GAUSSIAN, temperatureCoefficientPercentPerC: 0.12 };
    expect(valueAt23C(own, 170, 28)).toBeCloseTo(170 * (1 - 0.0012 * 5), 10);
    expect(() => valueAt23C(own, 170, 29)).toThrow(/18 to 28/);
    expect(() => valueAt23C({ ...own, temperatureCoefficientPercentPerC: 5 }, 170, 25)).toThrow(RangeError);
  });

  it('ends where the models end', () => {
    expect(() => valueAt23C(BORON, 13, 70)).toThrow(RangeError);
    expect(() => valueAt23C(GAUSSIAN, 170, -30)).toThrow(RangeError);
  });
});

describe('the temperature coefficient of a layer', () => {
  it('of a box is that of its resistivity', () => {
    const box = layerOfTarget(
      { ...GAUSSIAN, profile: 'box', backgroundDopant: null, backgroundDensityPerCm3: null },
      1e18,
    );
    const own = temperatureCoefficientPercentPerC('p', standardResistivity('boron', 1e18));
    expect(layerCoefficient(box)).toEqual({
      percentPerC: expect.closeTo(own, 12) as number,
      basis: 'measured',
    });
  });

  it('lies between those of its depths, nearer to where the current flows', () => {
    const { percentPerC, basis } = layerCoefficient(layerOfTarget(GAUSSIAN, 1e19));
    expect(basis).toBe('measured');
    expect(percentPerC).toBeGreaterThan(0.03);
    expect(percentPerC).toBeLessThan(0.2);
  });

  it('is the model’s where a depth has no published one: a surface below 0.001 Ω·cm', () => {
    const heavy = layerCoefficient(layerOfTarget({ ...GAUSSIAN, densityPerCm3: 3e20 }, 3e20));
    expect(heavy.basis).toBe('model');
    expect(heavy.percentPerC).toBeGreaterThan(0.1);
  });

  it('by the model’s ratio agrees with its slope at 23 °C', () => {
    const layer = layerOfTarget({ ...GAUSSIAN, densityPerCm3: 3e20 }, 3e20);
    const slope = 100 * (layerTemperatureRatio(layer, 23.5) - layerTemperatureRatio(layer, 22.5));
    expect(slope).toBeCloseTo(layerCoefficient(layer).percentPerC, 5);
  });
});

// ASTM F84 against the Arora model, where one hands over to the other [calc].
describe('the step at 18 and at 28 °C', () => {
  it.each([
    [28, -0.83],
    [18, 0.59],
  ] as const)('is stated at %s °C: %s percent for boron of 10 Ω·cm', (edge, percent) => {
    expect(temperatureStepPercent('boron', 1.34e15, 10, edge)).toBeCloseTo(percent, 2);
    const away = edge === 28 ? 28 + 1e-9 : 18 - 1e-9;
    const crossed =
      resistivityAtTemperature('boron', 1.34e15, 10, away) /
      resistivityAtTemperature('boron', 1.34e15, 10, edge);
    expect(100 * (crossed - 1)).toBeCloseTo(percent, 2);
  });

  it('stays below 1.1 % from 0.01 to 100 Ω·cm, and null where no coefficient serves', () => {
    for (const dopant of ['boron', 'phosphorus'] as const) {
      for (let x = 14.2; x < 18.5; x += 0.1) {
        const step = temperatureStepPercent(dopant, 10 ** x, standardResistivity(dopant, 10 ** x), 28);
        expect(Math.abs(step ?? 9)).toBeLessThan(1.1);
      }
    }
    expect(temperatureStepPercent('boron', 1e13, 1306, 28)).toBeNull();
  });

  it('does not arise within 18 to 28 °C: the coefficient is continuous there', () => {
    for (let celsius = 18; celsius < 28; celsius += 0.5) {
      const [a, b] = [celsius, celsius + 1e-7].map((t) => resistivityAtTemperature('boron', 1.34e15, 10, t));
      expect((b ?? 0) / (a ?? 1)).toBeCloseTo(1, 8);
    }
  });
});
