import type { PlanPart } from './plan-part';
import type { RobustDeviations } from './robust-deviations';
import { FAR_SCORE, type ScreenedReadings } from './screen-outliers';
import { fitResiduals } from './surface-fit';
import { surfaceVariance, weightedFit, type WeightedFit } from './weighted-fit';

/** Where the flexible surface is this much less certain than a reading, it says nothing against one. */
const LEAST_CERTAIN = 4;
/** There only a reading this far from the stiff surface, in its score and as a share of it, is surely no pattern. */
const SURE_SCORE = 20;
const SURE_SHARE = 0.05;

/**
 * What remains of far readings and features before the most flexible surface the sites allow: such a wafer may only
 * have more shape than the stiff surface knows. A reading stays far if it lies far from the flexible surface that
 * the ordinary ones make: the centre of a ring pattern, the only site that sees it, does not. Where no other
 * reading says how the flexible surface goes, only one grossly off the stiff one is sure. Features stay features
 * if the flexible surface, fitted to them too, leaves more than the stiff one does without them: it follows a bend, not
 * a step.
 */
export function heldAgainstFlexible(
  { lone, together }: ScreenedReadings,
  stiff: RobustDeviations,
  readings: Float64Array,
  part: PlanPart,
): ScreenedReadings {
  const { flexibleFit: fit, indices } = part;
  const ordinary = surfaceWithout([...lone, ...together.flat()], readings, part);
  const isFar = (site: number): boolean => {
    const place = indices.indexOf(site);
    const variance = ordinary === null ? Infinity : surfaceVariance(fit, ordinary.solved, place);
    if (ordinary === null || variance > LEAST_CERTAIN) {
      return (
        Math.abs(stiff.score[place]!) >= SURE_SCORE &&
        Math.abs(stiff.deviation[place]!) >= SURE_SHARE * Math.abs(stiff.surface[place]!)
      );
    }
    return Math.abs(ordinary.residuals[place]!) >= FAR_SCORE * ordinary.spread * Math.sqrt(1 + variance);
  };
  const withFeatures = together.length === 0 ? null : surfaceWithout(lone, readings, part);
  const isStep = withFeatures !== null && withFeatures.spread > stiff.spread;
  return { lone: lone.filter(isFar), together: isStep ? together : [] };
}

/** The flexible surface without some sites, and how the others scatter about it; null where too few are left. */
function surfaceWithout(
  sites: readonly number[],
  readings: Float64Array,
  { flexibleFit: fit, indices }: PlanPart,
): { solved: WeightedFit; residuals: Float64Array; spread: number } | null {
  const weights = new Float64Array(readings.length).fill(1);
  for (const site of sites) weights[indices.indexOf(site)] = 0;
  const freedom = readings.length - sites.length - fit.terms.length;
  const solved = freedom > 0 ? weightedFit(readings, fit, weights) : null;
  if (solved === null) return null;
  const residuals = fitResiduals(fit, readings, solved.coefficients);
  const squares = residuals.reduce((sum, residual, i) => sum + weights[i]! * residual * residual, 0);
  return { solved, residuals, spread: Math.sqrt(squares / freedom) };
}
