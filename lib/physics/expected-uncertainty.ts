import { isImplantedOrDiffused } from './is-implanted-or-diffused';
import { standardUncertaintyPercent } from './standard-uncertainty';
import type { Target } from './target';

/** How far the absolute sheet resistance of a made layer misses in practice, in percent (common practice, no source). */
const LAYER_BOUND_PERCENT = 20;

/**
 * The standard uncertainty (k = 1), in percent, of a target's expected value.
 *
 * With a calibration factor of known uncertainty that alone counts: the factor has taken up the bias of the model,
 * which is common to all wafers of a stream. Else the standard conversion's, and for implanted and diffused layers
 * also the 20 % by which they miss, read as a rectangular bound and added in quadrature (JCGM 100:2008, 5.1.2).
 *
 * @example a uniform boron target without calibration // 1.732
 */
export function expectedUncertaintyPercent(target: Target): number {
  if (target.calibrationFactor !== null && target.calibrationPercent !== null)
    return target.calibrationPercent;
  const standard = standardUncertaintyPercent(target.dopant);
  if (target.calibrationFactor !== null || !isImplantedOrDiffused(target)) return standard;
  return Math.hypot(standard, LAYER_BOUND_PERCENT / Math.sqrt(3));
}
