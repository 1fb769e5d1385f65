import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { discFactor, INFINITE_SHEET_FACTOR } from '@/lib/probe/disc-factor';
import { discPositionFactor } from '@/lib/probe/disc-position-factor';
import { discTransferResistance } from '@/lib/probe/disc-transfer-resistance';
import { dualConfiguration } from '@/lib/probe/dual-configuration';
import { fourPinResistance } from '@/lib/probe/four-pin-resistance';
import { spacingFactor } from '@/lib/probe/spacing-factor';
import { thicknessFactor } from '@/lib/probe/thickness-factor';

describe('the geometry of a probe', () => {
  it('gives the image solution at the centre the closed form, in every direction', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 3.01, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 6.3, noNaN: true }),
        (r, angle) => {
          const factor = discPositionFactor({ xMm: 0, yMm: 0 }, angle, 1, r / 2);
          expect(factor).toBeCloseTo(INFINITE_SHEET_FACTOR * discFactor(r, 1), 8);
        },
      ),
      { seed: 2 },
    );
  });

  it('gives the same reading with current and voltage pins exchanged (reciprocity)', () => {
    const [a, b, c, d] = [
      { xMm: 3, yMm: 1 },
      { xMm: -20, yMm: 5 },
      { xMm: 40, yMm: -12 },
      { xMm: 0, yMm: 33 },
    ];
    const one = discTransferResistance({ currentIn: a, currentOut: b, voltagePlus: c, voltageMinus: d }, 50);
    const two = discTransferResistance({ currentIn: c, currentOut: d, voltagePlus: a, voltageMinus: b }, 50);
    expect(two).toBeCloseTo(one, 12);
  });

  it('turns with the wafer: site and direction together change nothing', () => {
    const here = discPositionFactor({ xMm: 40, yMm: 0 }, 0.4, 1.588, 50);
    const turned = discPositionFactor({ xMm: 0, yMm: 40 }, 0.4 + Math.PI / 2, 1.588, 50);
    expect(turned).toBeCloseTo(here, 10);
  });

  it('thins to a factor of one and falls as 2·ln 2 over the ratio on a thick block', () => {
    expect(thicknessFactor(0.01)).toBe(1);
    expect(thicknessFactor(0.1 + 1e-9)).toBeCloseTo(1, 10);
    expect(thicknessFactor(1000) * 1000).toBeCloseTo(2 * Math.LN2, 4);
  });

  it('corrects spacing by 1.082 of its error (ASTM F84)', () => {
    expect(spacingFactor(1.588, 1.588)).toBe(1);
    expect(spacingFactor(1.58, 1.588)).toBeCloseTo(1.00545, 5);
  });

  it('refuses geometry that cannot be', () => {
    expect(() => discFactor(2.9, 1)).toThrow(RangeError);
    expect(() => discPositionFactor({ xMm: 49, yMm: 0 }, 0, 1, 50)).toThrow(/off the disc/);
    const [here, there] = [
      { xMm: 0, yMm: 0 },
      { xMm: 1, yMm: 0 },
    ];
    const shorted = {
      currentIn: here,
      currentOut: there,
      voltagePlus: here,
      voltageMinus: { xMm: 2, yMm: 0 },
    };
    expect(() => discTransferResistance(shorted, 50)).toThrow(/one place/);
    expect(() => thicknessFactor(0)).toThrow(RangeError);
    expect(() => spacingFactor(1, 2)).toThrow(RangeError);
    expect(() => dualConfiguration(1, 1)).toThrow(RangeError);
  });
});

describe('a reading', () => {
  const forward = { voltageV: 2e-3, currentA: 1e-3, voltageReverseV: null, currentReverseA: null };

  it('is the mean of both directions of current, and null without a current', () => {
    expect(fourPinResistance(forward)).toBeCloseTo(2, 12);
    const both = { ...forward, voltageReverseV: -2.2e-3, currentReverseA: -1e-3 };
    expect(fourPinResistance(both)).toBeCloseTo(2.1, 12);
    expect(fourPinResistance({ ...forward, currentA: 0 })).toBeNull();
    expect(fourPinResistance({ ...both, currentReverseA: 0 })).toBeNull();
  });
});
