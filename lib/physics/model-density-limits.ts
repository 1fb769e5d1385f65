import { compensatedLimits, isCompensated } from './compensated-target';
import { depletionWidth } from './depletion-width';
import { conductionType } from './dopant';
import { implantPeakShare } from './layer-extent';
import { layerOfTarget, targetLengthUm } from './layer-of-target';
import { monotoneRoot } from './monotone-root';
import { standardDensityLimits } from './standard-density-limits';
import type { ExpectedWafer, Target } from './target';
import { targetDensity } from './target-density';

/** A hair beyond a limit, so that the model is defined at it. */
const HAIR = 1e-6;

interface Limits {
  lowerPerCm3: number;
  upperPerCm3: number;
}

/** A grown layer must be thicker than what its junction depletes, which grows as the layer is doped lighter. */
function grownLimits(target: Target, limits: Limits, background: number, wafer: ExpectedWafer): Limits {
  const thicknessUm = targetLengthUm(target, wafer);
  const isOfOneType =
    target.backgroundDopant !== null &&
    conductionType(target.backgroundDopant) === conductionType(target.dopant);
  if (thicknessUm === null || isOfOneType) return limits;
  const spare = (ln: number): number => Math.log(thicknessUm / depletionWidth(Math.exp(ln), background));
  const [from, to] = [Math.log(limits.lowerPerCm3), Math.log(limits.upperPerCm3)];
  if (spare(from) > 0) return limits;
  const root = monotoneRoot(spare, from, to, 1e-12);
  return { ...limits, lowerPerCm3: root === null ? limits.upperPerCm3 : Math.exp(root) * (1 + HAIR) };
}

/**
 * The lowest and highest density, per cm³, for which `modelValue` of a target is defined. Over a background the
 * conversion is asked at the sum of both dopings, and the layer must be the heavier of the two, an implant also after
 * its drive-in; a grown layer must not be depleted through; compensated silicon must keep its type.
 */
export function modelDensityLimits(target: Target, wafer: ExpectedWafer = {}): Limits {
  if (isCompensated(target)) return compensatedLimits(target, targetDensity(target, wafer), wafer);
  const limits = standardDensityLimits(target.dopant);
  const background = target.backgroundDensityPerCm3;
  if (background === null || target.quantity === 'resistivity') return limits;
  if (target.profile === 'uniform') return grownLimits(target, limits, background, wafer);
  const layer = layerOfTarget(target, target.densityPerCm3, wafer);
  const peakShare = layer.profile === 'implant' ? implantPeakShare(layer) : 1;
  return {
    lowerPerCm3: Math.max(limits.lowerPerCm3, (background * (1 + HAIR)) / peakShare),
    upperPerCm3: limits.upperPerCm3 - background,
  };
}
