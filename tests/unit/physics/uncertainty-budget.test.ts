import { describe, expect, it } from 'vitest';
import { expectedBudget, expectedUncertaintyPercent } from '@/lib/physics/expected-uncertainty';
import { expectedValue } from '@/lib/physics/expected-value';
import { sensitivities } from '@/lib/physics/sensitivities';
import { boundedPart, combinedBudget, normalPart } from '@/lib/physics/uncertainty-budget';
import { BORON, EPI, GAUSSIAN } from './targets';

const names = (budget: ReturnType<typeof expectedBudget>) => budget.parts.map(({ name }) => name);

describe('an uncertainty budget (JCGM 100:2008)', () => {
  it('takes a bound as rectangular, its half-width over √3 (4.3.7), and adds in quadrature (5.1.2)', () => {
    const budget = combinedBudget([boundedPart('a', 3, true, ''), normalPart('b', 1, false, '')]);
    expect(budget.parts[0]?.standardPercent).toBeCloseTo(1.7320508, 7);
    expect(budget.standardPercent).toBeCloseTo(2, 12);
    expect(budget.expandedPercent).toBeCloseTo(4, 12);
  });

  it('leaves what is common to a stream out of one wafer against the next', () => {
    const budget = combinedBudget([
      boundedPart('a', 3, true, ''),
      normalPart('b', 0.4, false, ''),
      normalPart('c', 0.3, false, ''),
    ]);
    expect(budget.betweenWafersPercent).toBeCloseTo(0.5, 12);
  });

  it('of nothing is nothing, and of what cannot be is refused', () => {
    expect(combinedBudget([]).standardPercent).toBe(0);
    expect(() => combinedBudget([normalPart('a', -1, true, '')])).toThrow(RangeError);
    expect(() => combinedBudget([normalPart('a', Number.NaN, true, '')])).toThrow(RangeError);
  });
});

describe('the budget of an expected value', () => {
  it('of uniform silicon is the conversion’s self-consistency: 3 %/√3 for boron, 4.5 %/√3 for donors', () => {
    expect(names(expectedBudget(BORON))).toEqual(['conversion']);
    expect(expectedBudget(BORON).standardPercent).toBeCloseTo(3 / Math.sqrt(3), 12);
    expect(expectedBudget(EPI).standardPercent).toBeCloseTo(4.5 / Math.sqrt(3), 12);
    expect(expectedBudget(BORON).betweenWafersPercent).toBe(0);
  });

  it('is what the expected value carries, whatever the target', () => {
    for (const target of [
      BORON,
      EPI,
      GAUSSIAN,
      { ...GAUSSIAN, calibrationFactor: 1.1, calibrationPercent: 0.4 },
    ]) {
      expect(expectedValue(target).uncertaintyPercent).toBe(expectedUncertaintyPercent(target));
      expect(expectedBudget(target).standardPercent).toBe(expectedUncertaintyPercent(target));
    }
  });

  it('has no part for the tolerance (JCGM 106:2012)', () => {
    expect(expectedBudget({ ...BORON, tolerancePercent: 10 })).toEqual(expectedBudget(BORON));
  });

  it('lets a calibration stand in for the bias of the conversion and of activation', () => {
    expect(names(expectedBudget(GAUSSIAN))).toEqual(['conversion', 'activation and loss of dopant']);
    const calibrated = { ...GAUSSIAN, calibrationFactor: 1.1, calibrationPercent: 0.4 };
    expect(names(expectedBudget(calibrated))).toEqual(['calibration']);
    expect(expectedBudget(calibrated).standardPercent).toBe(0.4);
  });

  it('counts the spread of a model only where it stands in for the standard', () => {
    const budget = expectedBudget(BORON, {}, { model: 'masetti' });
    expect(names(budget)).toEqual(['masetti model']);
    expect(budget.parts[0]?.boundPercent).toBe(11);
  });

  it('carries temperature and thickness through their sensitivities, each wafer’s own', () => {
    const temperature = { temperatureC: 23, uncertaintyC: 0.5 };
    const budget = expectedBudget(EPI, {}, { temperature, thicknessPercent: 2 });
    expect(names(budget)).toEqual(['conversion', 'wafer temperature', 'thickness']);
    const moved = sensitivities(EPI);
    const [, warm, thick] = budget.parts.map(({ standardPercent }) => standardPercent);
    expect(warm).toBeCloseTo(0.5 * (moved.perMeasurementC ?? 0), 12);
    expect(thick).toBeCloseTo(2 * Math.abs(moved.perPercentThickness ?? 0), 12);
    expect(budget.betweenWafersPercent).toBeCloseTo(Math.hypot(warm ?? 0, thick ?? 0), 12);
  });

  it('shows by how much two sources of boron’s coefficient disagree, times the way to 23 °C', () => {
    const light = { ...BORON, densityPerCm3: 1.34e15 };
    const budget = expectedBudget(light, {}, { temperature: { temperatureC: 27, uncertaintyC: 0.1 } });
    const part = budget.parts.find(({ name }) => name === 'temperature coefficient');
    // 0.8248 against 0.7535 % per °C at 10 Ω·cm, four degrees away; common to all wafers measured so.
    expect(part?.boundPercent).toBeCloseTo(4 * (0.8248 - 0.7535), 2);
    expect(part?.isCommon).toBe(true);
    expect(
      names(
        expectedBudget(
          { ...light, temperatureCoefficientPercentPerC: 0.8 },
          {},
          { temperature: { temperatureC: 27, uncertaintyC: 0.1 } },
        ),
      ),
    ).not.toContain('temperature coefficient');
  });

  it('counts far from 23 °C what the share of ionized dopant would change', () => {
    const far = expectedBudget(
      { ...BORON, densityPerCm3: 1e18 },
      {},
      { temperature: { temperatureC: 60, uncertaintyC: 0 } },
    );
    const part = far.parts.find(({ name }) => name === 'incomplete ionization');
    // Boron at 1e18: a fifth to a quarter of the atoms hold their hole, fewer when warm.
    expect(part?.boundPercent).toBeGreaterThan(3);
    expect(part?.boundPercent).toBeLessThan(15);
  });
});
