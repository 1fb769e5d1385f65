/** A place on the wafer, mm from its centre. */
export interface Place {
  xMm: number;
  yMm: number;
}

/** The four pins of a reading by their use. */
export interface Pins {
  currentIn: Place;
  currentOut: Place;
  voltagePlus: Place;
  voltageMinus: Place;
}

/** Potential at `z`, on a sheet of 1 Ω/□, of 1 A entering at `s`, with its image outside the edge, up to a constant. */
function potential(z: Place, s: Place, radiusMm: number): number {
  const direct = Math.hypot(z.xMm - s.xMm, z.yMm - s.yMm);
  const real = radiusMm ** 2 - (z.xMm * s.xMm + z.yMm * s.yMm);
  const imaginary = z.xMm * s.yMm - z.yMm * s.xMm;
  return -(Math.log(direct) + Math.log(Math.hypot(real, imaginary))) / (2 * Math.PI);
}

/**
 * V/I of four pins anywhere on a thin insulated disc of 1 Ω/□: multiply by the sheet resistance to get what is read.
 *
 * Image sources in the complex plane: φ(z; s) = −(1/2π)·[ln|z − s| + ln|R² − z·conj(s)|]. Lengths in mm. Throws
 * RangeError unless all pins lie inside the disc and apart from each other.
 */
export function discTransferResistance(pins: Pins, radiusMm: number): number {
  const { currentIn, currentOut, voltagePlus, voltageMinus } = pins;
  for (const pin of [currentIn, currentOut, voltagePlus, voltageMinus]) {
    if (!(Math.hypot(pin.xMm, pin.yMm) < radiusMm)) {
      throw new RangeError(`A pin at ${pin.xMm}, ${pin.yMm} mm lies off the disc.`);
    }
  }
  const at = (z: Place): number => potential(z, currentIn, radiusMm) - potential(z, currentOut, radiusMm);
  const resistance = at(voltagePlus) - at(voltageMinus);
  if (!Number.isFinite(resistance)) throw new RangeError('Two pins stand on one place.');
  return resistance;
}
