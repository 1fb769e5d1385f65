import { describe, expect, it } from 'vitest';
import { chartedShift } from '@/lib/physics/charted-shift';
import { expectedValue } from '@/lib/physics/expected-value';
import type { Target } from '@/lib/physics/target';
import { uniformBoron as boron } from '../../support/uniform-boron';

describe('the shift of 100·ln(measured/expected) by a revised target', () => {
  it('is minus 100·ln of the factor by which a calibration raises the expected value', () => {
    // By formula: −100·ln 1.02.
    const { least, most } = chartedShift(boron, { ...boron, calibrationFactor: 1.02 }, [{}])!;
    expect(least).toBeCloseTo(-1.980263, 6);
    expect(most).toBe(least);
  });

  it('is undone by a tool that is set to the new target', () => {
    const after = { ...boron, densityPerCm3: 1.1e15 };
    const { least } = chartedShift(boron, after, [{}])!;
    const reading = expectedValue(boron).value * 1.01;
    const followed = reading * (expectedValue(after).value / expectedValue(boron).value);
    const charted = (measured: number, target: Target) =>
      100 * Math.log(measured / expectedValue(target).value);
    expect(charted(reading, after) - charted(reading, boron)).toBeCloseTo(least, 9);
    expect(charted(followed, after)).toBeCloseTo(charted(reading, boron), 9);
    expect(least).toBeGreaterThan(0);
  });

  it('tells the least and the most where it differs from wafer to wafer', () => {
    const crystal = { ...boron, alongCrystal: true };
    const shift = chartedShift(crystal, boron, [
      { ingotFraction: 0 },
      { ingotFraction: 0.5 },
      { ingotFraction: 0.8 },
    ])!;
    expect(shift.most).toBeCloseTo(0, 9);
    const tail = expectedValue(crystal, { ingotFraction: 0.8 }).value / expectedValue(boron).value;
    expect(shift.least).toBeCloseTo(100 * Math.log(tail), 9);
  });

  it('is none without a wafer of which both targets expect something', () => {
    const sheet: Target = { ...boron, quantity: 'sheet_resistance' };
    expect(chartedShift(boron, boron, [])).toBeNull();
    expect(chartedShift(sheet, { ...sheet, lengthUm: 10 }, [{}])).toBeNull();
    expect(chartedShift(boron, { ...boron, densityPerCm3: 1e22 }, [{}])).toBeNull();
  });
});
