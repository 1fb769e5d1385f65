import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calibrationStudy } from '@/lib/limits/calibration-study';
import { expectedValue } from '@/lib/physics/expected-value';
import { modelValue } from '@/lib/physics/model-value';
import type { Target } from '@/lib/physics/target';

const target: Target = {
  quantity: 'sheet_resistance',
  dopant: 'boron',
  densityPerCm3: 5e19,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'gaussian',
  lengthUm: 0.12,
  backgroundDopant: 'phosphorus',
  backgroundDensityPerCm3: 1e15,
  calibrationFactor: null,
  calibrationPercent: null,
};
const model = expectedValue(target).value;
const wafer = (subgroupId: string, ratio: number) => ({
  subgroupId,
  measured: ratio * model,
  ingotFraction: null,
  thicknessUm: 725,
});

const calibrationFactor = (...given: Parameters<typeof calibrationStudy>) => calibrationStudy(...given).found;

describe('a calibration', () => {
  it('is the mean of the subgroups’ ratios, with the standard uncertainty of that mean', () => {
    const found = calibrationFactor(target, 'implant', [wafer('1', 1.1), wafer('2', 1.2), wafer('3', 1.3)]);
    expect(found?.factor).toBeCloseTo(1.2, 12);
    expect(found?.spreadPercent).toBeCloseTo(100 * (0.1 / 1.2), 9);
    expect(found?.percent).toBeCloseTo(100 * (0.1 / 1.2 / Math.sqrt(3)), 9);
  });

  it('counts a subgroup once, however many wafers it has', () => {
    const found = calibrationFactor(target, 'implant', [wafer('1', 1), wafer('1', 1.2), wafer('2', 1.3)]);
    expect(found?.factor).toBeCloseTo(1.2, 12);
    expect(found).toMatchObject({ subgroups: 2, wafers: 3 });
  });

  it('compares with physics alone, whatever factor the target has already', () => {
    const wafers = [wafer('1', 1.1), wafer('2', 1.3)];
    const before = { ...target, calibrationFactor: 2, calibrationPercent: 1 };
    expect(calibrationFactor(before, 'implant', wafers)).toEqual(
      calibrationFactor(target, 'implant', wafers),
    );
  });

  it('is found also of an implant whose drive-in physics knows to an order of magnitude only', () => {
    const driven: Target = {
      ...target,
      profile: 'implant',
      rangeUm: 0.1,
      lengthUm: 0.04,
      driveInC: 1000,
      driveInMin: 30,
    };
    expect(() => expectedValue(driven)).toThrow(/order of magnitude/);
    const alone = modelValue(driven, driven.densityPerCm3);
    const measured = [1.4, 1.5].map((ratio, i) => ({ ...wafer(String(i), 1), measured: ratio * alone }));
    expect(calibrationFactor(driven, 'implant', measured)?.factor).toBeCloseTo(1.45, 12);
  });

  it('is none with fewer than two subgroups, or where physics expects nothing', () => {
    expect(calibrationFactor(target, 'implant', [])).toBeNull();
    expect(calibrationFactor(target, 'implant', [wafer('1', 1), wafer('1', 2)])).toBeNull();
    const crystal = { ...target, alongCrystal: true };
    expect(calibrationFactor(crystal, 'implant', [wafer('1', 1), wafer('2', 2)])).toBeNull();
  });

  it('leaves out and counts wafers beyond the conversion, as at the very end of a crystal', () => {
    const crystal: Target = {
      ...target,
      quantity: 'resistivity',
      dopant: 'phosphorus',
      densityPerCm3: 1e20,
      alongCrystal: true,
      profile: 'uniform',
      lengthUm: null,
      backgroundDopant: null,
      backgroundDensityPerCm3: null,
    };
    const at = (subgroupId: string, ingotFraction: number) => ({ ...wafer(subgroupId, 1), ingotFraction });
    expect(() => expectedValue(crystal, { ingotFraction: 0.9999 })).toThrow(RangeError);
    const wafers = [at('1', 0.1), at('2', 0.1), at('3', 0.9999), wafer('4', 1)];
    expect(calibrationStudy(crystal, 'crystal', wafers)).toMatchObject({
      found: { subgroups: 2, wafers: 2 },
      beyond: 1,
      lacking: 1,
    });
    expect(calibrationStudy(crystal, 'crystal', wafers.slice(1))).toEqual({
      found: null,
      beyond: 1,
      lacking: 1,
    });
  });

  it('grows with the readings and keeps its relative uncertainty', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 10, noNaN: true }), (times) => {
        const ratios = [1, 1.05, 0.98, 1.01];
        const at = (scale: number) =>
          calibrationFactor(
            target,
            'implant',
            ratios.map((ratio, i) => wafer(String(i), ratio * scale)),
          );
        expect(at(times)!.factor / at(1)!.factor / times).toBeCloseTo(1, 9);
        expect(at(times)!.percent).toBeCloseTo(at(1)!.percent, 6);
      }),
    );
  });
});
