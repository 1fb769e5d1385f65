import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { modelValue } from '@/lib/physics/model-value';
import { possibleCauses } from '@/lib/physics/possible-causes';
import { sensitivities } from '@/lib/physics/sensitivities';
import { BORON, DRIVEN, EPI } from './targets';

describe('what would explain a difference', () => {
  it('names the size each single cause would need, and how well that is known', () => {
    const causes = possibleCauses(0.98, 0.5, sensitivities(BORON));
    const dopant = causes.find(({ cause }) => cause === 'dopant');
    // A 2 % lower reading at 1e15: 2.05 % more boron, by the slope −0.986 of ASTM F723 [calc].
    expect(dopant?.size).toBeCloseTo((100 * Math.log(0.98)) / -0.986, 2);
    expect(dopant?.uncertainty).toBeCloseTo(0.5 / 0.986, 3);
    expect(causes.find(({ cause }) => cause === 'measurement-temperature')?.size).toBeCloseTo(-2.43, 1);
    expect(causes.find(({ cause }) => cause === 'thickness')?.size).toBeCloseTo(-2.02, 2);
  });

  it('gives sizes that do make the difference, for every cause of an implant', () => {
    const [dopant] = possibleCauses(0.99, 0, sensitivities(DRIVEN)).filter(({ cause }) => cause === 'dopant');
    const more = DRIVEN.densityPerCm3 * Math.exp((dopant?.size ?? 0) / 100);
    expect(modelValue(DRIVEN, more) / modelValue(DRIVEN, DRIVEN.densityPerCm3)).toBeCloseTo(0.99, 4);
    const [hotter] = possibleCauses(0.99, 0, sensitivities(DRIVEN)).filter(
      ({ cause }) => cause === 'drive-in-temperature',
    );
    const driven = { ...DRIVEN, driveInC: 1000 + (hotter?.size ?? 0) };
    expect(modelValue(driven, DRIVEN.densityPerCm3) / modelValue(DRIVEN, DRIVEN.densityPerCm3)).toBeCloseTo(
      0.99,
      3,
    );
  });

  it('puts first what takes least against what is usual, and lets a line say what is usual there', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.8, max: 1.2, noNaN: true }),
        fc.double({ min: 0.1, max: 5, noNaN: true }),
        (ratio, usual) => {
          const causes = possibleCauses(ratio, 1, sensitivities(EPI), { thickness: usual });
          expect([...causes].sort((a, b) => a.timesUsual - b.timesUsual)).toEqual(causes);
          expect(causes.find(({ cause }) => cause === 'thickness')?.usual).toBe(usual);
        },
      ),
      { seed: 3 },
    );
  });

  it('leaves out what the value does not answer to', () => {
    // n-type near 0.0087 Ω·cm has a temperature coefficient of about zero (ASTM F84).
    const flat = { ...sensitivities(BORON), perMeasurementC: 0.001 };
    expect(possibleCauses(0.98, 1, flat).map(({ cause }) => cause)).not.toContain('measurement-temperature');
    expect(possibleCauses(0.98, 1, sensitivities(BORON)).map(({ cause }) => cause)).not.toContain(
      'drive-in-temperature',
    );
  });

  it('says where a size lies farther than the slope carries', () => {
    const far = possibleCauses(0.8, 1, sensitivities(BORON));
    expect(far.every(({ isOnSlope }) => !isOnSlope)).toBe(true);
    expect(possibleCauses(0.98, 1, sensitivities(BORON)).every(({ isOnSlope }) => isOnSlope)).toBe(true);
  });

  it('needs nothing of anything where there is no difference', () => {
    for (const { size, timesUsual } of possibleCauses(1, 1, sensitivities(EPI))) {
      expect(Object.is(size, 0)).toBe(true);
      expect(timesUsual).toBe(0);
    }
  });

  it('refuses what cannot be', () => {
    expect(() => possibleCauses(0, 1, sensitivities(BORON))).toThrow(RangeError);
    expect(() => possibleCauses(1, -1, sensitivities(BORON))).toThrow(RangeError);
    expect(() => possibleCauses(1.1, 1, sensitivities(BORON), { dopant: 0 })).toThrow(RangeError);
  });
});
