/** A place on the wafer, mm from its centre. */
interface Place {
  xMm: number;
  yMm: number;
}

/** Potential at `z` of a current entering at `s`, with its image outside the disc's edge, up to a constant. */
function potential(z: Place, s: Place, radiusMm: number): number {
  const direct = Math.hypot(z.xMm - s.xMm, z.yMm - s.yMm);
  // R² − z·conj(s)
  const real = radiusMm ** 2 - (z.xMm * s.xMm + z.yMm * s.yMm);
  const imaginary = -(z.yMm * s.xMm - z.xMm * s.yMm);
  return -(Math.log(direct) + Math.log(Math.hypot(real, imaginary))) / (2 * Math.PI);
}

/**
 * The factor k of Rs = k·V/I for four pins in line anywhere on an insulated disc: current through the outer pins,
 * voltage between the inner ones. Tends to π/ln 2 far from the edge and replaces it, edge included.
 *
 * Image sources on a thin disc (method of images, complex plane). `angleRadians` is the direction of the pins
 * against +x. Lengths in mm. Throws RangeError unless all four pins lie inside the disc.
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
  const pin = (along: number): Place => ({
    xMm: site.xMm + along * spacingMm * Math.cos(angleRadians),
    yMm: site.yMm + along * spacingMm * Math.sin(angleRadians),
  });
  const [a, b, c, d] = [pin(-1.5), pin(-0.5), pin(0.5), pin(1.5)];
  if (![a, d].every((p) => Math.hypot(p.xMm, p.yMm) < radiusMm)) {
    throw new RangeError(`A pin of the probe at ${site.xMm}, ${site.yMm} mm lies off the disc.`);
  }
  const voltage = (z: Place): number => potential(z, a, radiusMm) - potential(z, d, radiusMm);
  return 1 / (voltage(b) - voltage(c));
}
