import { discTransferResistance, type Place } from './disc-transfer-resistance';
import { dualConfiguration } from './dual-configuration';
import { pinsInLine } from './pins-in-line';

/**
 * How many times too high the exact dual form reads at a site of an insulated disc, its pins in line along
 * `angleRadians`: what it makes of the image solution's two resistances of a sheet of 1 Ω/□. 1 along a diameter, and far
 * from the edge.
 *
 * Lengths in mm. Source as `discTransferResistance`. Throws RangeError unless all four pins lie inside the disc.
 *
 * @example dualConfigurationExcess({ xMm: 59.25, yMm: 0 }, Math.PI / 2, 1, 62.5) // 1.005
 */
export function dualConfigurationExcess(
  site: Place,
  angleRadians: number,
  spacingMm: number,
  radiusMm: number,
): number {
  if (!(spacingMm > 0 && radiusMm > 0)) throw new RangeError('Spacing and radius are positive.');
  const [p1, p2, p3, p4] = pinsInLine(site, angleRadians, spacingMm);
  const a = { currentIn: p1, currentOut: p4, voltagePlus: p2, voltageMinus: p3 };
  const b = { currentIn: p1, currentOut: p3, voltagePlus: p2, voltageMinus: p4 };
  return dualConfiguration(discTransferResistance(a, radiusMm), discTransferResistance(b, radiusMm));
}

/**
 * The sheet resistance, in Ω/□, of two four-pin resistances taken anywhere on an insulated disc: the exact dual form,
 * which forgives unequal pins, freed of what the edge adds across the radius (`dualConfigurationExcess`).
 *
 * Resistances in Ω, lengths in mm. Throws RangeError where either does.
 *
 * @example dualConfigurationOnDisc(R_A and R_B of 100 Ω/□ there, { xMm: 59.25, yMm: 0 }, Math.PI / 2, 1, 62.5) // 100
 */
export function dualConfigurationOnDisc(
  resistanceAOhm: number,
  resistanceBOhm: number,
  site: Place,
  angleRadians: number,
  spacingMm: number,
  radiusMm: number,
): number {
  return (
    dualConfiguration(resistanceAOhm, resistanceBOhm) /
    dualConfigurationExcess(site, angleRadians, spacingMm, radiusMm)
  );
}
