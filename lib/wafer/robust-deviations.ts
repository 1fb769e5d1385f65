import { neighbourCorrelation } from './neighbour-correlation';
import { patchGains } from './patch-gains';
import type { PlanPart } from './plan-part';
import { fitCoefficients, fitResiduals, type SurfaceFit } from './surface-fit';
import { trimmedResiduals } from './trimmed-residuals';
import { surfaceVariance, weightedFit, type WeightedFit } from './weighted-fit';

/** How far each reading lies from a smooth surface that the far ones do not bend. */
export interface RobustDeviations {
  /** Reading less surface, in the reading's unit. */
  deviation: Float64Array;
  /** The same in robust standard deviations of a reading that the surface has not seen. */
  score: Float64Array;
  /** The value of the surface at each site. */
  surface: Float64Array;
  /** Standard deviation of the readings about the surface, the far ones left out. */
  spread: number;
}

/**
 * The quick ways out. Leaving out the patch of a far reading or a feature explains much of what the plain fit leaves;
 * several gross readings apart hide that from each other, but not their own scores. On a plan of many sites, where
 * trying all patches takes longest, they are tried only where a reading scores 3.5 or neighbours go the same way: about
 * 140 of 1 000 even wafers with 49 sites, of which one or two are looked at closer.
 */
const LOUD_SCORE = 8;
const LIVELY_SCORE = 3.5;
const LIVELY_CORRELATION = 0;
const FEW_SITES = 36;
const TELLING_GAIN = 12;
/**
 * A gauge does not repeat to better than about 0.05 % of its reading (common practice, no source):
 * smaller steps of an even wafer are never called far.
 */
const LEAST_SPREAD = 5e-4;
/** Tuning of the biweight for 95 % efficiency: Mosteller and Tukey, Data Analysis and Regression (1977), from memory. */
const BIWEIGHT = 4.685;
const MOST_STEPS = 20;
/** The part of a site's own residual below which nothing else vouches for the surface there. */
const LEAST_FREEDOM = 0.05;

/**
 * Scores each reading against the smooth surface that the others make: an MM-estimate (Yohai, Ann. Stat. 15, 642
 * (1987), from memory), which is a start that a quarter of the readings cannot bend (`trimmedResiduals`), made
 * efficient by reweighting with Tukey's biweight (Holland and Welsch, Commun. Stat. A6, 813 (1977), from memory).
 * `readings` follows the sites of `part`. Null when nothing can be far: a plain fit, a few microseconds, has said so.
 */
export function robustDeviations(readings: Float64Array, part: PlanPart): RobustDeviations | null {
  const fit = part.screenFit;
  const n = readings.length;
  const p = fit.terms.length;
  if (n === 0 || p === 0) return null;
  const plain = fitResiduals(fit, readings, fitCoefficients(fit, readings));
  const floor = LEAST_SPREAD * Math.abs(middle(readings.slice().sort()));
  let sigma = medianSpread(plain, p, floor);
  if (!(sigma > 0) || !Number.isFinite(sigma)) return null;
  const greatest = greatestScore(plain, sigma, fit);
  const isLively =
    n <= FEW_SITES || greatest > LIVELY_SCORE || neighbourCorrelation(plain, part.pairs) > LIVELY_CORRELATION;
  if (!isLively) return null;
  const gains = patchGains(plain, part.patches, p);
  if (greatest <= LOUD_SCORE && !gains.some((gain) => gain > TELLING_GAIN)) return null;

  let residuals = trimmedResiduals(readings, fit, plain, byGain(part, gains));
  sigma = medianSpread(residuals, p, floor);
  let weights: Float64Array = new Float64Array(n);
  let solved: WeightedFit | null = null;
  for (let step = 0; step < MOST_STEPS; step++) {
    const next = residuals.map((residual) => {
      const u = residual / (BIWEIGHT * sigma);
      return Math.abs(u) >= 1 ? 0 : (1 - u * u) ** 2;
    });
    if (step > 0 && next.every((weight, i) => Math.abs(weight - weights[i]!) < 0.01)) break;
    const better = weightedFit(readings, fit, next);
    if (better === null) break;
    solved = better;
    weights = next;
    residuals = fitResiduals(fit, readings, solved.coefficients);
    sigma = medianSpread(residuals, p, floor);
  }
  if (solved === null) return null;
  const spread = Math.max(sigma, settledSpread(residuals, sigma, p));
  return {
    deviation: residuals,
    score: scores(residuals, spread, fit, weights, solved),
    surface: readings.map((value, i) => value - residuals[i]!),
    spread,
  };
}

function greatestScore(residuals: Float64Array, sigma: number, { leverage }: SurfaceFit): number {
  let greatest = 0;
  for (let i = 0; i < residuals.length; i++) {
    const square = residuals[i]! ** 2 / Math.max(LEAST_FREEDOM, 1 - leverage[i]!);
    if (square > greatest) greatest = square;
  }
  return Math.sqrt(greatest) / sigma;
}

/** The patches of the plan, the most telling first. */
function byGain({ patches }: PlanPart, gains: Float64Array): Int32Array[] {
  const order = Array.from(gains.keys()).sort((a, b) => gains[b]! - gains[a]!);
  return order.map((patch) => patches.members[patch]!);
}

function middle(sorted: Float64Array): number {
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}

/** Median absolute residual, scaled to a standard deviation, corrected for the terms fitted. */
function medianSpread(residuals: Float64Array, terms: number, floor: number): number {
  const n = residuals.length;
  const sizes = residuals.map(Math.abs);
  return Math.max(floor, 1.482602218505602 * middle(sizes.sort()) * Math.sqrt(n / Math.max(1, n - terms)));
}

/** Standard deviation of the residuals that kept a weight: on small plans far steadier than the median's. */
function settledSpread(residuals: Float64Array, sigma: number, terms: number): number {
  let squares = 0;
  let kept = 0;
  for (const residual of residuals) {
    if (Math.abs(residual) >= BIWEIGHT * sigma) continue;
    squares += residual * residual;
    kept++;
  }
  return kept > terms ? Math.sqrt(squares / (kept - terms)) : 0;
}

/** Deleted residuals over their standard deviation: what a reading is against a surface without it. */
function scores(
  residuals: Float64Array,
  sigma: number,
  fit: SurfaceFit,
  weights: Float64Array,
  solved: WeightedFit,
): Float64Array {
  const score = new Float64Array(residuals.length);
  for (let i = 0; i < score.length; i++) {
    const pull = surfaceVariance(fit, solved, i);
    const freedom = 1 - weights[i]! * pull;
    if (freedom < LEAST_FREEDOM) continue;
    score[i] = residuals[i]! / freedom / (sigma * Math.sqrt(1 + pull / freedom));
  }
  return score;
}
