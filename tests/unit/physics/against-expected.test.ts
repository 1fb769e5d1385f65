import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { againstExpected } from '@/lib/physics/against-expected';
import { expectedValue } from '@/lib/physics/expected-value';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { uniformBoron as boron } from '../../support/uniform-boron';

describe('a measured wafer against what physics expects', () => {
  it('reads a wafer doped 2 % more as +2 % dopant, whatever that does to the reading', () => {
    const found = againstExpected(boron, standardResistivity('boron', 1.02e15))!;
    expect(found.dopantPercent).toBeCloseTo(2, 6);
    expect(found.densityPerCm3! / 1.02e15).toBeCloseTo(1, 9);
    expect(found.differencePercent).toBeLessThan(-1.9);
    expect(found.differencePercent).toBeGreaterThan(-2);
  });

  it('carries the uncertainty of the conversion into dopant by its sensitivity (JCGM 100:2008, 5.1.2)', () => {
    const expected = expectedValue(boron);
    const found = againstExpected(boron, expected.value)!;
    expect(found.differencePercent).toBe(0);
    expect(found.differenceUncertaintyPercent).toBe(expected.uncertaintyPercent);
    expect(found.dopantUncertaintyPercent).toBeCloseTo(
      expected.uncertaintyPercent / -expected.sensitivity,
      6,
    );
  });

  it('agrees with a small step of the target itself', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 14, max: 19, noNaN: true }),
        fc.double({ min: 0.9, max: 1.1, noNaN: true }),
        (lg, share) => {
          const target = { ...boron, densityPerCm3: 10 ** lg };
          const found = againstExpected(target, standardResistivity('boron', share * 10 ** lg))!;
          expect(found.dopantPercent).toBeCloseTo(100 * (share - 1), 5);
          expect(Math.sign(found.differencePercent)).toBe(-Math.sign(found.dopantPercent!));
        },
      ),
      { seed: 5, numRuns: 200 },
    );
  });

  it('divides the calibration out of the density but not out of the reading', () => {
    const calibrated = { ...boron, calibrationFactor: 1.1, calibrationPercent: 0.5 };
    const reading = 1.1 * standardResistivity('boron', 1e15);
    const found = againstExpected(calibrated, reading)!;
    expect(found.differencePercent).toBeCloseTo(0, 9);
    expect(found.dopantPercent).toBeCloseTo(0, 6);
    expect(againstExpected(boron, reading)!.differencePercent).toBeCloseTo(10, 6);
  });

  it('expects nothing along a crystal without the wafer’s place, and refuses a reading that is not positive', () => {
    expect(againstExpected({ ...boron, alongCrystal: true }, 10)).toBeNull();
    expect(againstExpected({ ...boron, densityPerCm3: 1e30 }, 10)).toBeNull();
    expect(() => againstExpected(boron, 0)).toThrow(RangeError);
    expect(() => againstExpected(boron, Infinity)).toThrow(RangeError);
  });

  it('says nothing of the dopant where no density gives the reading', () => {
    const found = againstExpected(boron, 1e9)!;
    expect(found.densityPerCm3).toBeNull();
    expect(found.dopantPercent).toBeNull();
    expect(Number.isFinite(found.differencePercent)).toBe(true);
  });
});
