import { describe, expect, it } from 'vitest';
import { discFactor, INFINITE_SHEET_FACTOR } from '@/lib/probe/disc-factor';
import { discPositionFactor } from '@/lib/probe/disc-position-factor';
import { discTransferResistance, type Place } from '@/lib/probe/disc-transfer-resistance';
import { dualConfiguration } from '@/lib/probe/dual-configuration';
import { pinsInLine } from '@/lib/probe/pins-in-line';
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

  /** What two configurations make of a 1 Ω/□ disc, 125 mm wide. */
  function dualOnDisc(site: Place, angle: number, spacingMm: number): number {
    const [p1, p2, p3, p4] = pinsInLine(site, angle, spacingMm);
    const a = { currentIn: p1, currentOut: p4, voltagePlus: p2, voltageMinus: p3 };
    const b = { currentIn: p1, currentOut: p3, voltagePlus: p2, voltageMinus: p4 };
    return dualConfiguration(discTransferResistance(a, 62.5), discTransferResistance(b, 62.5));
  }

  // R. Rymaszewski, J. Phys. E 2, 170 (1969); sizes [calc].
  it('needs no edge correction in dual configuration with the pins along a diameter', () => {
    for (const xMm of [0, 30, 58]) expect(dualOnDisc({ xMm, yMm: 0 }, 0, 1.588)).toBeCloseTo(1, 9);
  });

  it.each([
    [1, 0.5],
    [1.588, 2.6],
  ])(
    'errs in dual configuration across the radius near the edge, at %s mm spacing by %s percent',
    (spacing, percent) => {
      const read = dualOnDisc({ xMm: 62.5 - 3.25, yMm: 0 }, Math.PI / 2, spacing);
      expect((read - 1) * 100).toBeCloseTo(percent, 1);
    },
  );
});
