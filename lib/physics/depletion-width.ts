import { intrinsicDensity } from './intrinsic-density';

const CHARGE_C = 1.602176634e-19;
const THERMAL_V = 8.617333262e-5 * 300;
/** Permittivity of silicon, F/cm: 11.7 times that of vacuum. */
const PERMITTIVITY = 11.7 * 8.8541878128e-14;

function builtInV(densityPerCm3: number, backgroundDensityPerCm3: number): number {
  const ni = intrinsicDensity(300);
  if (!(
    densityPerCm3 > ni &&
    backgroundDensityPerCm3 > ni &&
    Number.isFinite(densityPerCm3 * backgroundDensityPerCm3)
  )) {
    throw new RangeError(
      `A junction needs doping on both sides, not ${densityPerCm3} and ${backgroundDensityPerCm3} per cm³.`,
    );
  }
  return THERMAL_V * (Math.log(densityPerCm3 / ni) + Math.log(backgroundDensityPerCm3 / ni));
}

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
  const [n, nb] = [densityPerCm3, backgroundDensityPerCm3];
  return 1e4 * Math.sqrt(((2 * PERMITTIVITY * builtInV(n, nb)) / CHARGE_C) * (nb / (n + nb) / n));
}

/**
 * d ln w/d ln N of `depletionWidth`: ½·(kT/qV − 1 − N/(N + Nb)), near −½ for a layer lighter than what lies under it.
 * Throws RangeError as there.
 */
export function depletionSensitivity(densityPerCm3: number, backgroundDensityPerCm3: number): number {
  const [n, nb] = [densityPerCm3, backgroundDensityPerCm3];
  return (THERMAL_V / builtInV(n, nb) - 1 - n / (n + nb)) / 2;
}
