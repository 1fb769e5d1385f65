import { intrinsicDensity } from './intrinsic-density';

const CHARGE_C = 1.602176634e-19;
const BOLTZMANN_EV = 8.617333262e-5;
/** Permittivity of silicon, F/cm: 11.7 times that of vacuum. */
const PERMITTIVITY = 11.7 * 8.8541878128e-14;

/**
 * How far, in µm, the depleted zone of an unbiased abrupt junction reaches into a layer, at 300 K: that much of the
 * layer's thickness does not conduct, and its sheet resistance is ρ/(t − w).
 *
 * w = √(2·ε·V/q · Nb/(N·(N + Nb))), V = (kT/q)·ln(N·Nb/ni²) (textbook depletion approximation). `densityPerCm3` of the
 * layer, `backgroundDensityPerCm3` of the other type under it. Throws RangeError unless both exceed ni.
 *
 * @example depletionWidth(1e15, 1e19) // 1.04
 */
export function depletionWidth(densityPerCm3: number, backgroundDensityPerCm3: number): number {
  const [n, nb, ni] = [densityPerCm3, backgroundDensityPerCm3, intrinsicDensity(300)];
  if (!(n > ni && nb > ni && Number.isFinite(n * nb))) {
    throw new RangeError(`A junction needs doping on both sides, not ${n} and ${nb} per cm³.`);
  }
  const builtInV = BOLTZMANN_EV * 300 * (Math.log(n / ni) + Math.log(nb / ni));
  return 1e4 * Math.sqrt(((2 * PERMITTIVITY * builtInV) / CHARGE_C) * (nb / (n + nb) / n));
}
