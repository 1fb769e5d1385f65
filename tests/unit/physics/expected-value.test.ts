import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { densityFromMeasured } from '@/lib/physics/density-from-measured';
import { depletionWidth } from '@/lib/physics/depletion-width';
import { expectedValue } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import { sheetResistance } from '@/lib/physics/sheet-resistance';
import { standardDensity } from '@/lib/physics/standard-density';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import type { Target } from '@/lib/physics/target';
import { targetDensity } from '@/lib/physics/target-density';
import { uniformBoron as boron } from '../../support/uniform-boron';

const diffused: Target = {
  ...boron,
  quantity: 'sheet_resistance',
  profile: 'gaussian',
  densityPerCm3: 1e19,
  lengthUm: 0.5,
  backgroundDopant: 'phosphorus',
  backgroundDensityPerCm3: 1e15,
};

describe('the expected value', () => {
  it('is the standard conversion for a uniform resistivity target', () => {
    const expected = expectedValue(boron);
    expect(expected.value).toBeCloseTo(13.306, 3);
    expect(expected.fromPhysics).toBe(expected.value);
    expect(expected.uncertaintyPercent).toBeCloseTo(3 / Math.sqrt(3), 12);
    expect(expected.toleranceLower).toBeNull();
    expect(expected.notes).toEqual([]);
  });

  it('puts the tolerance apart: the band widens, the uncertainty does not', () => {
    const expected = expectedValue({ ...boron, tolerancePercent: 10 });
    expect(expected.uncertaintyPercent).toBe(expectedValue(boron).uncertaintyPercent);
    expect(expected.toleranceLower).toBeCloseTo(standardResistivity('boron', 1.1e15), 12);
    expect(expected.toleranceUpper).toBeCloseTo(standardResistivity('boron', 0.9e15), 12);
  });

  it('leaves a tolerance limit out where the conversion ends before it', () => {
    const expected = expectedValue({ ...boron, densityPerCm3: 1e21, tolerancePercent: 5 });
    expect(expected.toleranceLower).toBeNull();
    expect(expected.toleranceUpper).toBeGreaterThan(expected.value);
  });

  it('follows the crystal by Scheil’s law and asks for the wafer’s place', () => {
    const crystal: Target = { ...boron, dopant: 'phosphorus', alongCrystal: true };
    expect(missingForExpected(crystal)).toBe('ingotFraction');
    expect(() => expectedValue(crystal)).toThrow(RangeError);
    const seed = expectedValue(crystal, { ingotFraction: 0 }).value;
    expect(expectedValue(crystal, { ingotFraction: 0.5 }).value / seed).toBeCloseTo(0.6486, 4);
  });

  it('divides a layer’s resistivity by its thickness, the wafer’s own where it has one', () => {
    const epi: Target = { ...boron, quantity: 'sheet_resistance', lengthUm: 10 };
    expect(expectedValue(epi).value).toBeCloseTo(13306.2, 0);
    expect(expectedValue(epi, { layerThicknessUm: 5 }).value).toBeCloseTo(2 * 13306.2184505, 4);
    expect(missingForExpected({ ...epi, lengthUm: null })).toBe('layerThicknessUm');
    expect(missingForExpected({ ...epi, lengthUm: null }, { layerThicknessUm: 5 })).toBeNull();
    expect(() => expectedValue({ ...epi, lengthUm: null })).toThrow(/thickness/);
  });

  it('shows a calibrated and an uncalibrated value, and lets the factor’s uncertainty stand alone', () => {
    const plain = expectedValue(diffused);
    const calibrated = expectedValue({ ...diffused, calibrationFactor: 1.08, calibrationPercent: 0.4 });
    expect(plain.value).toBeCloseTo(170.0, 1);
    expect(plain.uncertaintyPercent).toBeCloseTo(Math.hypot(3, 20) / Math.sqrt(3), 10);
    expect(calibrated.fromPhysics).toBe(plain.value);
    expect(calibrated.value).toBeCloseTo(1.08 * plain.value, 10);
    expect(calibrated.uncertaintyPercent).toBe(0.4);
    expect(plain.notes.join(' ')).toMatch(/5 to 20 %/);
  });

  const epi: Target = {
    ...boron,
    quantity: 'sheet_resistance',
    lengthUm: 10,
    backgroundDensityPerCm3: 1e19,
  };

  it('lets a grown layer end at the depletion edge of its junction', () => {
    // 1e15 on 1e19: 1.04 µm, recomputed from the depletion approximation [calc].
    const expected = expectedValue({ ...epi, backgroundDopant: 'phosphorus' });
    expect(expected.notes.join(' ')).toMatch(/1\.04 µm/);
    const conductingCm = (10 - depletionWidth(1e15, 1e19)) * 1e-4;
    expect(expected.value).toBeCloseTo(standardResistivity('boron', 1e15) / conductingCm, 6);
  });

  it('refuses a grown layer that is depleted through', () => {
    const thin = { ...epi, backgroundDopant: 'phosphorus' as const, lengthUm: 1 };
    expect(() => expectedValue(thin)).toThrow(/nothing of it conducts/);
  });

  it('refuses a layer on a substrate of its own type unless another method is declared', () => {
    const onOwnType = { ...epi, backgroundDopant: 'boron' as const };
    expect(() => expectedValue(onOwnType)).toThrow(/measures the substrate/);
    const asResistivity: Target = { ...onOwnType, quantity: 'resistivity' };
    expect(() => expectedValue(asResistivity)).toThrow(/measures the substrate/);
    expect(expectedValue({ ...asResistivity, method: 'other' }).value).toBe(
      standardResistivity('boron', 1e15),
    );
    const other = expectedValue({ ...onOwnType, method: 'other' });
    expect(other.value).toBeCloseTo(standardResistivity('boron', 1e15) / 1e-3, 8);
    expect(other.notes.join(' ')).toMatch(/another method/);
  });

  it('says where phosphorus stands in for arsenic', () => {
    const notes = expectedValue({ ...boron, dopant: 'arsenic', densityPerCm3: 1e18 }).notes;
    expect(notes.join(' ')).toMatch(/not established/);
  });

  it('keeps its sensitivity on one side of arsenic’s step', () => {
    const at = (densityPerCm3: number): number =>
      expectedValue({ ...boron, dopant: 'arsenic', densityPerCm3 }).sensitivity;
    expect(at(1e19)).toBeCloseTo(at(1.0005e19), 2);
    expect(at(0.99999e19)).toBeCloseTo(at(0.99e19), 2);
    expect(() => standardDensity('arsenic', 5.6e-3, 'numeric')).toThrow(RangeError);
  });

  it('refuses what cannot be', () => {
    expect(() => expectedValue({ ...boron, densityPerCm3: 1e11 })).toThrow(RangeError);
    expect(() => expectedValue({ ...boron, densityPerCm3: Number.NaN })).toThrow(RangeError);
    expect(() => expectedValue({ ...boron, tolerancePercent: 100 })).toThrow(RangeError);
    expect(() => expectedValue({ ...boron, calibrationFactor: 0 })).toThrow(RangeError);
    expect(() => expectedValue({ ...boron, profile: 'gaussian' })).toThrow(/no single resistivity/);
    expect(() => expectedValue({ ...diffused, backgroundDopant: 'boron' })).toThrow(/no junction/);
    expect(() =>
      expectedValue({ ...diffused, backgroundDopant: null, backgroundDensityPerCm3: null }),
    ).toThrow(/background/);
  });
});

describe('the density from a measured value', () => {
  it('closes the circle with the expected value, calibration included', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 17, max: 20, noNaN: true }),
        fc.double({ min: 0.5, max: 2, noNaN: true }),
        fc.constantFrom(boron, diffused, { ...boron, quantity: 'sheet_resistance' as const, lengthUm: 3 }),
        (decade, calibrationFactor, base) => {
          const target = { ...base, densityPerCm3: 10 ** decade, calibrationFactor };
          const back = densityFromMeasured(target, expectedValue(target).value);
          expect((back ?? 0) / target.densityPerCm3).toBeCloseTo(1, 8);
        },
      ),
      { seed: 5, numRuns: 60 },
    );
  });

  it('is the density in the wafer, not at the seed end', () => {
    const crystal: Target = { ...boron, alongCrystal: true };
    const wafer = { ingotFraction: 0.6 };
    const back = densityFromMeasured(crystal, expectedValue(crystal, wafer).value, wafer);
    expect((back ?? 0) / targetDensity(crystal, wafer)).toBeCloseTo(1, 9);
  });

  it('is null for readings no density gives, and without a thickness', () => {
    for (const reading of [0, -1, Number.NaN, Infinity, 1e9, 1e-9]) {
      expect(densityFromMeasured(boron, reading)).toBeNull();
    }
    expect(densityFromMeasured({ ...boron, quantity: 'sheet_resistance' }, 100)).toBeNull();
  });
});

describe('a layer', () => {
  it('of erfc shape has its junction where the two dopings meet', () => {
    const figures = sheetResistance({
      profile: 'erfc',
      dopant: 'phosphorus',
      peakDensityPerCm3: 1e20,
      lengthUm: 0.4,
      backgroundDopant: 'boron',
      backgroundDensityPerCm3: 1e20 * 0.004677734981047266, // erfc(2), Abramowitz and Stegun table 7.1 (memory)
    });
    expect(figures.junctionDepthUm).toBeCloseTo(0.8, 10);
  });

  it('halves its sheet resistance when its length doubles', () => {
    const layer = { ...diffused, profile: 'gaussian' as const, peakDensityPerCm3: 1e19, lengthUm: 0.5 };
    const once = sheetResistance(layer).sheetResistanceOhmSq;
    expect(sheetResistance({ ...layer, lengthUm: 1 }).sheetResistanceOhmSq / once).toBeCloseTo(0.5, 8);
  });
});
