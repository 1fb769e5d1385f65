import { positiveInverse } from './positive-inverse';
import type { SurfaceFit } from './surface-fit';

/** A fit in which not every reading counts alike. */
export interface WeightedFit {
  coefficients: Float64Array;
  /** Covariance of the coefficients for readings of variance 1, row by row. */
  covariance: Float64Array;
}

/**
 * The weighted least-squares fit of the surface: minimises Σ wᵢ·eᵢ². A reading of weight 0 is left out.
 * Null where the readings that count do not determine the surface. A ridge of 1e-9 of the mean diagonal keeps
 * what is barely determined finite.
 */
export function weightedFit(
  readings: Float64Array,
  fit: SurfaceFit,
  weights: Float64Array,
): WeightedFit | null {
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
  return { coefficients, covariance };
}

/** How far the surface at site `i` follows from the readings: variance of its value for readings of variance 1. */
export function surfaceVariance(fit: SurfaceFit, { covariance }: WeightedFit, i: number): number {
  const p = fit.terms.length;
  let variance = 0;
  for (let k = 0; k < p; k++) {
    let sum = 0;
    for (let j = 0; j < p; j++) sum += covariance[k * p + j]! * fit.columns[j]![i]!;
    variance += sum * fit.columns[k]![i]!;
  }
  return variance;
}
