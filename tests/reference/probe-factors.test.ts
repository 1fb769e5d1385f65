import { describe, expect, it } from 'vitest';
import { discFactor, INFINITE_SHEET_FACTOR } from '@/lib/probe/disc-factor';
import { discPositionFactor } from '@/lib/probe/disc-position-factor';
import { discTransferResistance, type Place } from '@/lib/probe/disc-transfer-resistance';
import { dualConfigurationExcess, dualConfigurationOnDisc } from '@/lib/probe/dual-configuration-on-disc';
import { dualConfigurationQuadratic } from '@/lib/probe/dual-configuration-quadratic';
import { dualConfiguration } from '@/lib/probe/dual-configuration';
import { pinsInLine } from '@/lib/probe/pins-in-line';
import { spacingFactor } from '@/lib/probe/spacing-factor';
import { thicknessFactor } from '@/lib/probe/thickness-factor';

// F. M. Smits, Bell Syst. Tech. J. 37, 711 (1958), tables recalled [memory], held within 4e-4 (and half a unit of its last digit).
describe('the four-point probe', () => {
  it.each([
    [3, 2.2662],
    [5, 3.3625],
    [10, 4.1716],
    [20, 4.4364],
    [40, 4.5076],
  ])('has at the centre of a disc %s spacings wide the factor %s', (ratio, factor) => {
    expect(Math.abs(INFINITE_SHEET_FACTOR * discFactor(ratio, 1) - factor)).toBeLessThanOrEqual(4.2e-4);
  });

  it.each([
    [0.5, 0.9974],
    [1, 0.9214],
    [1.4286, 0.7938],
    [2, 0.6336],
  ])('has on a wafer %s spacings thick the factor %s', (ratio, factor) => {
    expect(Math.abs(thicknessFactor(ratio) - factor)).toBeLessThanOrEqual(4e-4);
  });

  it('has π/ln 2 = 4.532360142 on a thin sheet without end [calc]', () => {
    expect(INFINITE_SHEET_FACTOR).toBeCloseTo(4.532360142, 9);
    expect(discPositionFactor({ xMm: 10, yMm: 20 }, 0.3, 1, 1e5)).toBeCloseTo(4.53236, 5);
  });

  it('finds the sheet of the two ideal configurations, 0.220636 and 0.174850 of it [calc]', () => {
    expect(dualConfiguration(0.220636, 0.17485)).toBeCloseTo(1, 5);
  });

  const onRadius = (edgeMm: number): Place => ({ xMm: 62.5 - edgeMm, yMm: 0 });

  // R. Rymaszewski, J. Phys. E 2, 170 (1969); sizes [calc], on a disc of 125 mm.
  it('needs no edge correction in dual configuration with the pins along a diameter', () => {
    for (const xMm of [0, 30, 58])
      expect(dualConfigurationExcess({ xMm, yMm: 0 }, 0, 1.588, 62.5)).toBeCloseTo(1, 9);
  });

  it.each([
    [1, 0.5],
    [1.588, 2.6],
  ])(
    'errs in dual configuration across the radius 3.25 mm from the edge, at %s mm spacing by %s percent, and the image solution does not',
    (spacing, percent) => {
      const read = dualConfigurationExcess(onRadius(3.25), Math.PI / 2, spacing, 62.5);
      expect((read - 1) * 100).toBeCloseTo(percent, 1);
      const [a, b] = dualOnDisc(pinsInLine(onRadius(3.25), Math.PI / 2, spacing), 100);
      expect(dualConfigurationOnDisc(a, b, onRadius(3.25), Math.PI / 2, spacing, 62.5)).toBeCloseTo(100, 9);
    },
  );

  it('forgives pins 2 % out of place near the edge, five times better than one configuration does', () => {
    const site = onRadius(5);
    const [p1, p2, p3, p4] = pinsInLine(site, Math.PI / 2, 1);
    const uneven = [p1, { ...p2, yMm: p2.yMm + 0.02 }, { ...p3, yMm: p3.yMm - 0.02 }, p4] as const;
    const [a, b] = dualOnDisc(uneven, 100);
    const dual = Math.abs(dualConfigurationOnDisc(a, b, site, Math.PI / 2, 1, 62.5) / 100 - 1);
    const single = Math.abs((a * discPositionFactor(site, Math.PI / 2, 1, 62.5)) / 100 - 1);
    expect(single).toBeGreaterThan(0.02);
    expect(dual).toBeLessThan(single / 5);
  });

  /** The two resistances that pins read on a disc of 125 mm. */
  function dualOnDisc(
    [p1, p2, p3, p4]: readonly [Place, Place, Place, Place],
    ohmSq: number,
  ): [number, number] {
    const a = { currentIn: p1, currentOut: p4, voltagePlus: p2, voltageMinus: p3 };
    const b = { currentIn: p1, currentOut: p3, voltagePlus: p2, voltageMinus: p4 };
    return [ohmSq * discTransferResistance(a, 62.5), ohmSq * discTransferResistance(b, 62.5)];
  }

  // ASTM F1529 / SEMI MF1529 form in general use [1]; its bound against the exact form [calc].
  it('agrees with the quadratic dual form within 0.06 % from R_A/R_B of 1.20 to 1.345, which is refused elsewhere', () => {
    let worst = 0;
    for (let ratio = 1.2; ratio <= 1.345; ratio += 0.0005) {
      worst = Math.max(
        worst,
        Math.abs(dualConfigurationQuadratic(ratio, 1) / dualConfiguration(ratio, 1) - 1),
      );
    }
    expect(worst * 100).toBeLessThan(0.06);
    expect(worst * 100).toBeGreaterThan(0.04);
    expect(() => dualConfigurationQuadratic(1.19, 1)).toThrow(/1.20 to 1.345/);
    expect(() => dualConfigurationQuadratic(1.35, 1)).toThrow(RangeError);
    expect(() => dualConfigurationQuadratic(1.25, 0)).toThrow(RangeError);
    // Beyond its range the same form would miss by more than a percent: that is why it is refused.
    const beyond = 1.5 * (-14.696 + 25.173 * 1.5 - 7.872 * 1.5 ** 2);
    expect(Math.abs(beyond / dualConfiguration(1.5, 1) - 1)).toBeGreaterThan(0.01);
  });

  it('corrects spacing by 1.082 of its error (ASTM F84) [1], as moving the inner pins apart does [calc]', () => {
    const far = 1e4;
    const read = (inner: number): number => {
      const at = (xMm: number): Place => ({ xMm, yMm: 0 });
      const outer = (3 - inner) / 2 + inner / 2;
      const pins = {
        currentIn: at(-outer),
        currentOut: at(outer),
        voltagePlus: at(-inner / 2),
        voltageMinus: at(inner / 2),
      };
      return discTransferResistance(pins, far);
    };
    const exact = read(1) / read(1.001);
    expect((exact - 1) / -0.001).toBeCloseTo(1.082, 2);
    expect(spacingFactor(1.001, 1)).toBeCloseTo(exact, 5);
  });
});
