import { fitResiduals, type SurfaceFit } from './surface-fit';
import { weightedFit } from './weighted-fit';

/** The surface is fitted to this share of the readings, whichever it fits best: a quarter may be anything. */
const KEPT_SHARE = 0.75;
const STARTS = 2;
const MOST_STEPS = 10;

/**
 * What a least-trimmed-squares surface leaves of the readings: the surface whose smallest three quarters of
 * squared residuals have the least sum, which a feature of several sites cannot bend as it bends a plain fit
 * (Rousseeuw, J. Am. Stat. Assoc. 79, 871 (1984), from memory). Each start is improved by fitting to the readings
 * that lie nearest, until their squares grow no smaller ("C-steps": Rousseeuw and Van Driessen, Data Min. Knowl.
 * Discov. 12, 29 (2006), from memory). There the starts are random; here they are the plain fit and those without
 * one of `patches`, the most telling first and none overlapping: what spoils a wafer lies together on it, and the
 * same wafer always gives the same answer. `residuals` are those of the plain fit.
 */
export function trimmedResiduals(
  readings: Float64Array,
  fit: SurfaceFit,
  residuals: Float64Array,
  patches: readonly Int32Array[],
): Float64Array {
  const keep = Math.ceil(KEPT_SHARE * readings.length);
  let best = { residuals, squares: Infinity };
  const starts = [
    nearest(residuals, keep).weights,
    ...disjoint(patches).map((patch) => without(patch, readings.length)),
  ];
  for (const start of starts) {
    let weights = start;
    let reached = Infinity;
    for (let step = 0; step < MOST_STEPS; step++) {
      const solved = weightedFit(readings, fit, weights);
      if (solved === null) break;
      const left = fitResiduals(fit, readings, solved.coefficients);
      const kept = nearest(left, keep);
      if (kept.squares < best.squares) best = { residuals: left, squares: kept.squares };
      if (kept.squares >= reached * (1 - 1e-9)) break;
      reached = kept.squares;
      weights = kept.weights;
    }
  }
  return best.residuals;
}

/** The readings nearest the surface, those equally near together, with the sum of their squares. */
function nearest(residuals: Float64Array, keep: number): { weights: Float64Array; squares: number } {
  const squares = residuals.map((residual) => residual * residual);
  const limit = squares.slice().sort()[keep - 1]!;
  const weights = squares.map((square) => (square <= limit ? 1 : 0));
  return { weights, squares: squares.reduce((sum, square, i) => sum + weights[i]! * square, 0) };
}

function disjoint(patches: readonly Int32Array[]): Int32Array[] {
  const chosen: Int32Array[] = [];
  for (const patch of patches) {
    if (chosen.length === STARTS) break;
    if (!chosen.some((other) => patch.some((site) => other.includes(site)))) chosen.push(patch);
  }
  return chosen;
}

function without(patch: Int32Array, sites: number): Float64Array {
  const weights = new Float64Array(sites).fill(1);
  for (const site of patch) weights[site] = 0;
  return weights;
}
