import { intrinsicDensity } from './intrinsic-density';

/** Free electrons and holes, per cm³. */
export interface Carriers {
  electronsPerCm3: number;
  holesPerCm3: number;
}

/**
 * Electrons and holes in silicon that holds donors and acceptors, from charge neutrality with both carriers, every
 * dopant ionized: with d = (Nd − Na)/2 the majority is √(d² + ni²) + |d| and the minority ni² over it, never the
 * difference, which cancels.
 *
 * Densities per cm³, temperature in K. Source: textbook mass action law with ni of `intrinsicDensity`. Throws
 * RangeError for a negative density and outside 78…340 K.
 *
 * @example carriers(1e15, 0, 300).electronsPerCm3 // 1e15
 */
export function carriers(donorsPerCm3: number, acceptorsPerCm3: number, temperatureK: number): Carriers {
  if (![donorsPerCm3, acceptorsPerCm3].every((d) => d >= 0 && Number.isFinite(d))) {
    throw new RangeError(
      `Dopant densities are not negative; they are ${donorsPerCm3} and ${acceptorsPerCm3}.`,
    );
  }
  const intrinsic = intrinsicDensity(temperatureK);
  const d = (donorsPerCm3 - acceptorsPerCm3) / 2;
  const majority = Math.hypot(d, intrinsic) + Math.abs(d);
  const minority = (intrinsic / majority) * intrinsic;
  return d >= 0
    ? { electronsPerCm3: majority, holesPerCm3: minority }
    : { electronsPerCm3: minority, holesPerCm3: majority };
}
