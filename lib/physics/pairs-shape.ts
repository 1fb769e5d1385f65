import type { LayerShape } from './layer';

/** One depth of a profile and the dopant density there. */
export interface DepthDensity {
  depthUm: number;
  densityPerCm3: number;
}

/** The most depths a profile may hold. */
const MOST_PAIRS = 2000;

/**
 * A profile given as depths and densities, as a shape with its peak. Between two depths it runs straight in ln of the
 * density, as dopant profiles are drawn; above the first depth it keeps that density, and it ends at the last.
 *
 * Throws RangeError with fewer than two or more than 2000 pairs, for depths that do not rise from 0 or more, and for
 * densities that are not positive.
 */
export function pairsShape(pairs: readonly DepthDensity[]): {
  shape: Extract<LayerShape, { profile: 'pairs' }>;
  peakDensityPerCm3: number;
} {
  if (pairs.length < 2 || pairs.length > MOST_PAIRS) {
    throw new RangeError(`A profile has 2 to ${MOST_PAIRS} depths, not ${pairs.length}.`);
  }
  let [before, peakDensityPerCm3] = [-Infinity, 0];
  for (const { depthUm, densityPerCm3 } of pairs) {
    if (!(depthUm >= 0 && depthUm > before && Number.isFinite(depthUm))) {
      throw new RangeError(`The depths of a profile rise from the surface down; ${depthUm} µm does not.`);
    }
    if (!(densityPerCm3 > 0 && Number.isFinite(densityPerCm3))) {
      throw new RangeError(`A profile's densities are positive; at ${depthUm} µm it is ${densityPerCm3}.`);
    }
    before = depthUm;
    peakDensityPerCm3 = Math.max(peakDensityPerCm3, densityPerCm3);
  }
  const steps = pairs.map(({ depthUm, densityPerCm3 }) => ({
    depthUm,
    lnShare: Math.log(densityPerCm3 / peakDensityPerCm3),
  }));
  return { shape: { profile: 'pairs', steps }, peakDensityPerCm3 };
}
