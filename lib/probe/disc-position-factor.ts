import { discTransferResistance, type Place } from './disc-transfer-resistance';
import { pinsInLine } from './pins-in-line';

/**
 * The factor k of Rs = k·V/I for four pins in line anywhere on an insulated disc: current through the outer pins,
 * voltage between the inner ones. Tends to π/ln 2 far from the edge and replaces it, edge included.
 *
 * `angleRadians` is the direction of the pins against +x. Lengths in mm. Source as `discTransferResistance`. Throws
 * RangeError unless all four pins lie inside the disc.
 *
 * @example discPositionFactor({ xMm: 0, yMm: 0 }, 0, 1, 5) // 4.1712, as π/ln 2·discFactor(10, 1)
 */
export function discPositionFactor(
  site: Place,
  angleRadians: number,
  spacingMm: number,
  radiusMm: number,
): number {
  if (!(spacingMm > 0 && radiusMm > 0)) throw new RangeError('Spacing and radius are positive.');
  const [currentIn, voltagePlus, voltageMinus, currentOut] = pinsInLine(site, angleRadians, spacingMm);
  return 1 / discTransferResistance({ currentIn, currentOut, voltagePlus, voltageMinus }, radiusMm);
}
