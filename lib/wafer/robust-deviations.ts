import { positiveInverse } from './positive-inverse';
import { fitCoefficients, fitResiduals, type SurfaceFit } from './surface-fit';

/** How far each reading lies from a smooth surface that the far ones do not bend. */
export interface RobustDeviations {
  /** Reading less surface, in the reading's unit. */
  deviation: Float64Array;
  /** The same in robust standard deviations of a reading that the surface has not seen. */
  score: Float64Array;
  /** The value of the surface at each site. */
  surface: Float64Array;
}

/** Where no reading of the plain fit scores this much, none scores 6 against the robust one: the quick way out. */
const QUIET_SCORE = 4.5;
/**
 * A gauge does not repeat to better than about 0.05 % of its reading (common practice, no source):
 * smaller steps of an even wafer are never called far.
 */
const LEAST_SPREAD = 5e-4;
/** Tuning of the biweight for 95 % efficiency: Mosteller and Tukey, Data Analysis and Regression (1977), from memory. */
const BIWEIGHT = 4.685;
const HUBER = 1.345;
const HUBER_STEPS = 5;
const MOST_STEPS = 20;
/** The part of a site's own residual below which nothing else vouches for the surface there. */
const LEAST_FREEDOM = 0.05;

/**
 * Fits the surface by iteratively reweighted least squares (Huber's weights to settle, then Tukey's
 * biweight; Holland and Welsch, Commun. Stat. A6, 813 (1977), from memory) and scores each reading
 * against the surface that the others make. `readings` follows the sites of `fit`. Null when nothing
 * can be far: a plain fit, a few microseconds, has said so.
 */
export function robustDeviations(readings: Float64Array, fit: SurfaceFit): RobustDeviations | null {
  const n = readings.length;
  const p = fit.terms.length;
  if (n === 0 || p === 0) return null;
  let residuals: Float64Array = fitResiduals(fit, readings, fitCoefficients(fit, readings));
  const floor = LEAST_SPREAD * Math.abs(middle(readings.slice().sort()));
  let sigma = medianSpread(residuals, p, floor);
  if (!(sigma > 0) || !Number.isFinite(sigma) || isQuiet(residuals, sigma, fit)) return null;

  let weights: Float64Array = new Float64Array(n).fill(1);
  let covariance: Float64Array = new Float64Array(0);
  for (let step = 0; step < MOST_STEPS; step++) {
    const next = new Float64Array(n);
    let change = 0;
    for (let i = 0; i < n; i++) {
      const u = Math.abs(residuals[i]!) / sigma;
      if (step < HUBER_STEPS) next[i] = u <= HUBER ? 1 : HUBER / u;
      else next[i] = u >= BIWEIGHT ? 0 : (1 - (u / BIWEIGHT) ** 2) ** 2;
      change = Math.max(change, Math.abs(next[i]! - weights[i]!));
    }
    if (step > HUBER_STEPS && change < 0.01) break;
    const solved = weightedFit(readings, fit, next);
    if (solved === null) break;
    weights = next;
    covariance = solved.covariance;
    residuals = fitResiduals(fit, readings, solved.coefficients);
    sigma = medianSpread(residuals, p, floor);
  }
  if (covariance.length === 0) return null;
  const surface = readings.map((value, i) => value - residuals[i]!);
  const settled = Math.max(sigma, settledSpread(residuals, sigma, p));
  return { deviation: residuals, score: scores(residuals, settled, fit, weights, covariance), surface };
}

function isQuiet(residuals: Float64Array, sigma: number, fit: SurfaceFit): boolean {
  for (let i = 0; i < residuals.length; i++) {
    const freedom = Math.max(LEAST_FREEDOM, 1 - fit.leverage[i]!);
    if (Math.abs(residuals[i]!) > QUIET_SCORE * sigma * Math.sqrt(freedom)) return false;
  }
  return true;
}

function middle(sorted: Float64Array): number {
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}

/** Median absolute residual, scaled to a standard deviation, corrected for the terms fitted. */
function medianSpread(residuals: Float64Array, terms: number, floor: number): number {
  const n = residuals.length;
  const sizes = new Float64Array(n);
  for (let i = 0; i < n; i++) sizes[i] = Math.abs(residuals[i]!);
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

function weightedFit(readings: Float64Array, fit: SurfaceFit, weights: Float64Array) {
  const n = readings.length;
  const p = fit.terms.length;
  const normal = new Float64Array(p * p);
  const right = new Float64Array(p);
  const weighted = new Float64Array(n);
  let trace = 0;
  for (let k = 0; k < p; k++) {
    const a = fit.columns[k]!;
    for (let i = 0; i < n; i++) {
      weighted[i] = a[i]! * weights[i]!;
      right[k]! += weighted[i]! * readings[i]!;
    }
    for (let j = 0; j <= k; j++) {
      const b = fit.columns[j]!;
      let sum = 0;
      for (let i = 0; i < n; i++) sum += weighted[i]! * b[i]!;
      normal[k * p + j] = sum;
      normal[j * p + k] = sum;
    }
    trace += normal[k * p + k]!;
  }
  for (let k = 0; k < p; k++) normal[k * p + k]! += (1e-9 * trace) / p;
  const covariance = positiveInverse(normal, p);
  if (covariance === null) return null;
  const coefficients = new Float64Array(p);
  for (let k = 0; k < p; k++) {
    for (let j = 0; j < p; j++) coefficients[k]! += covariance[k * p + j]! * right[j]!;
  }
  return { covariance, coefficients };
}

/** Deleted residuals over their standard deviation: what a reading is against a surface without it. */
function scores(
  residuals: Float64Array,
  sigma: number,
  fit: SurfaceFit,
  weights: Float64Array,
  covariance: Float64Array,
): Float64Array {
  const p = fit.terms.length;
  const score = new Float64Array(residuals.length);
  for (let i = 0; i < score.length; i++) {
    let pull = 0;
    for (let k = 0; k < p; k++) {
      let sum = 0;
      for (let j = 0; j < p; j++) sum += covariance[k * p + j]! * fit.columns[j]![i]!;
      pull += sum * fit.columns[k]![i]!;
    }
    const freedom = 1 - weights[i]! * pull;
    if (freedom < LEAST_FREEDOM) continue;
    score[i] = residuals[i]! / freedom / (sigma * Math.sqrt(1 + pull / freedom));
  }
  return score;
}
