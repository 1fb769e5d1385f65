import { describe, expect, it } from 'vitest';
import { discFactor, INFINITE_SHEET_FACTOR } from '@/lib/probe/disc-factor';
import { discPositionFactor } from '@/lib/probe/disc-position-factor';
import { dualConfiguration } from '@/lib/probe/dual-configuration';
import { thicknessFactor } from '@/lib/probe/thickness-factor';

// F. M. Smits, Bell Syst. Tech. J. 37, 711 (1958), tables recalled (memory), held within 4e-4 (and half a unit of its last digit).
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
});
