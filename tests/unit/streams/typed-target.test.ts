import { describe, expect, it } from 'vitest';
import { faultsOf } from '@/app/_ui/form-state';
import { expectedValue } from '@/lib/physics/expected-value';
import { layerDose } from '@/lib/physics/layer-dose';
import { layerExtent } from '@/lib/physics/layer-extent';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { typedTarget } from '@/lib/streams/typed-target';
import { wordsOfTarget } from '@/lib/streams/words-of-target';
import { BORON, DRIVEN, EPI, ERFC, GAUSSIAN, IMPLANT, PAIRS } from '../physics/targets';

describe('typedTarget', () => {
  const faults = (quantity: 'resistivity' | 'sheet_resistance', words: Record<string, string>) => {
    const parsed = typedTarget(quantity).safeParse({ dopant: 'boron', profile: 'uniform', ...words });
    return parsed.success ? [] : faultsOf(parsed.error);
  };

  it('takes a plain target and leaves out what was not said', () => {
    const words = { dopant: 'boron', densityPerCm3: '1e15', profile: 'uniform', backgroundDopant: '' };
    expect(typedTarget('resistivity').parse(words)).toEqual({
      quantity: 'resistivity',
      dopant: 'boron',
      densityPerCm3: 1e15,
      tolerancePercent: null,
      alongCrystal: false,
      profile: 'uniform',
      lengthUm: null,
      backgroundDopant: null,
      backgroundDensityPerCm3: null,
      calibrationFactor: null,
      calibrationPercent: null,
    });
  });

  it('refuses, beside the field, what physics cannot expect anything of', () => {
    expect(faults('resistivity', { densityPerCm3: '1e25' })[0]?.field).toBe('densityPerCm3');
    expect(
      faults('resistivity', { densityPerCm3: '1e19', profile: 'gaussian', lengthUm: '1' })[0]?.reason,
    ).toContain('no single resistivity');
    expect(faults('sheet_resistance', { densityPerCm3: '1e19', profile: 'erfc' })[0]?.field).toBe('lengthUm');
  });

  it('asks what a graded layer ends on', () => {
    const words = { densityPerCm3: '1e19', profile: 'gaussian', lengthUm: '0.5' };
    expect(faults('sheet_resistance', words)[0]?.field).toBe('backgroundDopant');
    const whole = { ...words, backgroundDopant: 'phosphorus', backgroundDensityPerCm3: '1e15' };
    expect(faults('sheet_resistance', whole)).toEqual([]);
  });

  it('lets each wafer bring its own thickness to a uniform layer', () => {
    expect(faults('sheet_resistance', { densityPerCm3: '1e16' })).toEqual([]);
  });

  it('wants a background whole, and an uncertainty with its factor', () => {
    expect(faults('resistivity', { densityPerCm3: '1e15', backgroundDopant: 'phosphorus' })[0]?.field).toBe(
      'backgroundDensityPerCm3',
    );
    expect(faults('resistivity', { densityPerCm3: '1e15', calibrationPercent: '1' })[0]?.field).toBe(
      'calibrationFactor',
    );
  });

  const target = (quantity: 'resistivity' | 'sheet_resistance', words: Record<string, string>) =>
    typedTarget(quantity).parse({ dopant: 'boron', profile: 'uniform', ...words });
  const onN = { backgroundDopant: 'phosphorus', backgroundDensityPerCm3: '1e15' };

  it('finds the density from a resistivity by the numeric inverse, which closes', () => {
    const found = target('resistivity', { given: 'resistivity', resistivityOhmCm: '10' });
    expect(expectedValue(found).value).toBeCloseTo(10, 8);
    const beyond = { given: 'resistivity', resistivityOhmCm: '1e7' };
    expect(faults('resistivity', beyond)[0]).toMatchObject({
      field: 'resistivityOhmCm',
      reason: expect.stringContaining('No boron density'),
    });
  });

  it('finds the peak from a dose, and a length from the depth of the junction', () => {
    const words = { given: 'dose', dosePerCm2: '4.431e14', profile: 'gaussian', lengthUm: '0.5', ...onN };
    // The gaussian of 4.431e14 per cm² and 0.5 µm has its peak at 1e19 and its junction at 1.517 µm (own integral).
    const dosed = target('sheet_resistance', words);
    expect(dosed.densityPerCm3 / 1e19).toBeCloseTo(1, 4);
    for (const profile of ['gaussian', 'erfc']) {
      const sheet = { profile, densityPerCm3: '1e19', lengthGiven: 'junction', junctionUm: '1.5', ...onN };
      const layer = layerOfTarget(target('sheet_resistance', sheet), 1e19);
      expect(layerExtent(layer).junctionUm).toBeCloseTo(1.5, 9);
    }
    const implant = { profile: 'implant', given: 'dose', dosePerCm2: '3e14', ...onN };
    const driven = target('sheet_resistance', { ...implant, rangeUm: '0.2', lengthUm: '0.05' });
    expect(layerDose(layerOfTarget(driven, driven.densityPerCm3)) / 3e14).toBeCloseTo(1, 4);
  });

  it('takes a profile line by line, and names the line that is none', () => {
    const words = { profile: 'pairs', pairs: '0 1e19\n0.5; 3 × 10¹⁸\n\n1.2\t1e15', ...onN };
    const taken = target('sheet_resistance', words);
    expect(taken.pairs?.map(({ densityPerCm3 }) => densityPerCm3)).toEqual([1e19, 3e18, 1e15]);
    expect(taken.densityPerCm3).toBe(1e19);
    expect(faults('sheet_resistance', { ...words, pairs: '0 1e19\ndeep' })[0]).toMatchObject({
      field: 'pairs',
      reason: expect.stringContaining('Line 2'),
    });
  });

  it.each([
    ['a range', { profile: 'implant', densityPerCm3: '1e19', lengthUm: '0.05', ...onN }, 'rangeUm'],
    ['a straggle', { profile: 'implant', densityPerCm3: '1e19', rangeUm: '0.1', ...onN }, 'lengthUm'],
    [
      'a time',
      {
        profile: 'implant',
        densityPerCm3: '1e18',
        rangeUm: '0.1',
        lengthUm: '0.05',
        driveInC: '950',
        ...onN,
      },
      'driveInMin',
    ],
    ['a profile', { profile: 'pairs', densityPerCm3: '1e19', ...onN }, 'pairs'],
    ['a second density', { densityPerCm3: '1e15', counterDopant: 'phosphorus' }, 'counterDensityPerCm3'],
    ['a junction', { profile: 'erfc', densityPerCm3: '1e19', lengthGiven: 'junction', ...onN }, 'junctionUm'],
  ])('asks for %s where it is missing', (_what, words, field) => {
    const quantity = field === 'counterDensityPerCm3' ? 'resistivity' : 'sheet_resistance';
    expect(faults(quantity, words)[0]?.field).toBe(field);
  });

  it('refuses an epitaxial layer on its own type, unless another method is declared', () => {
    const words = { densityPerCm3: '1e15', backgroundDopant: 'boron', backgroundDensityPerCm3: '1e19' };
    expect(faults('sheet_resistance', words)[0]?.reason).toContain('four-point probe measures the substrate');
    expect(faults('sheet_resistance', { ...words, method: 'other' })).toEqual([]);
  });

  it('takes a drive-in of which only the order of magnitude is known, so that it can be calibrated', () => {
    const words = { profile: 'implant', densityPerCm3: '1e20', rangeUm: '0.1', lengthUm: '0.04', ...onN };
    const hot = { ...words, driveInC: '900', driveInMin: '30' };
    expect(faults('sheet_resistance', hot)).toEqual([]);
    expect(() => expectedValue(target('sheet_resistance', hot))).toThrow(/order of magnitude/);
  });

  it.each([BORON, GAUSSIAN, ERFC, IMPLANT, DRIVEN, PAIRS, EPI])(
    'makes the same target of the words of a target: $profile',
    (given) => {
      expect(typedTarget(given.quantity).parse(wordsOfTarget(given))).toEqual(given);
    },
  );
});
