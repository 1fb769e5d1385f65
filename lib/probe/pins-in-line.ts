import type { Place } from './disc-transfer-resistance';

/**
 * Where the four pins of a probe stand: in line through `site`, equally spaced, along `angleRadians` against +x,
 * numbered 1 to 4 in that direction. Lengths in mm.
 */
export function pinsInLine(
  site: Place,
  angleRadians: number,
  spacingMm: number,
): readonly [Place, Place, Place, Place] {
  const pin = (along: number): Place => ({
    xMm: site.xMm + along * spacingMm * Math.cos(angleRadians),
    yMm: site.yMm + along * spacingMm * Math.sin(angleRadians),
  });
  return [pin(-1.5), pin(-0.5), pin(0.5), pin(1.5)];
}
