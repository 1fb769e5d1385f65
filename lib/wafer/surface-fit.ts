import { EigenvalueDecomposition, inverse, Matrix } from 'ml-matrix';
import { discTermValue, type DiscTerm, type DiscTermGroup } from './disc-terms';
import type { Site } from './site';

/**
 * A least-squares fit made ready for one set of sites: everything that does not depend on the
 * readings, so that a wafer costs two small matrix products. `columns` and `solution` hold one row
 * of `sites` numbers for each term: coefficients = solution · readings, surface = columns' · coefficients.
 */
export interface SurfaceFit {
  sites: number;
  terms: DiscTerm[];
  columns: Float64Array[];
  solution: Float64Array[];
  /** How much each reading pulls the surface towards itself, 0…1 (the hat matrix's diagonal). */
  leverage: Float64Array;
  /** Variance of each coefficient for readings of variance 1. */
  unscaledVariance: Float64Array;
}

/** Belsley, Kuh and Welsch, Regression Diagnostics (1980), from memory: 30 marks strong collinearity. */
const MOST_CONDITION_NUMBER = 30;

function norm(column: Float64Array): number {
  return Math.sqrt(column.reduce((sum, value) => sum + value * value, 0));
}

function gram(columns: readonly Float64Array[]): Matrix {
  return new Matrix(
    columns.map((a) => columns.map((b) => a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0))),
  );
}

/** Condition number of the columns, each scaled to length 1: from the eigenvalues of their products. */
function conditionNumber(columns: readonly Float64Array[]): number {
  const lengths = columns.map(norm);
  if (lengths.some((length) => length < 1e-9)) return Infinity;
  const scaled = columns.map((column, k) => column.map((value) => value / (lengths[k] ?? 1)));
  const values = new EigenvalueDecomposition(gram(scaled), { assumeSymmetric: true }).realEigenvalues;
  const least = Math.min(...values);
  return least <= 0 ? Infinity : Math.sqrt(Math.max(...values) / least);
}

/**
 * Prepares the fit of the disc shapes to these sites. Shapes are taken up in the given order as far
 * as the sites can tell them apart: at most one term for every `sitesPerTerm` sites (a third as many
 * terms as sites unless said otherwise), and a condition number under 30. The two orientations of a shape come together, so that turning the wafer changes
 * nothing; one alone only where the other is zero on every site (a scan or a cross on the axes).
 * Fewer sites than that give no terms. Throws a RangeError when the radius is not positive.
 */
export function surfaceFit(
  sites: readonly Site[],
  unitRadiusMm: number,
  groups: readonly DiscTermGroup[],
  sitesPerTerm = 3,
): SurfaceFit {
  if (!(unitRadiusMm > 0)) throw new RangeError(`unitRadiusMm must be positive: ${unitRadiusMm}`);
  const most = Math.floor(sites.length / sitesPerTerm);
  const terms: DiscTerm[] = [];
  const columns: Float64Array[] = [];
  for (const group of groups) {
    const tried = group
      .map((term) => ({
        term,
        column: Float64Array.from(sites, (s) =>
          discTermValue(term, s.xMm / unitRadiusMm, s.yMm / unitRadiusMm),
        ),
      }))
      .filter(({ column }) => column.some((value) => Math.abs(value) > 1e-9));
    if (tried.length === 0) continue;
    if (terms.length + tried.length > most) break;
    const next = [...columns, ...tried.map(({ column }) => column)];
    if (conditionNumber(next) >= MOST_CONDITION_NUMBER) continue;
    terms.push(...tried.map(({ term }) => term));
    columns.push(...tried.map(({ column }) => column));
  }
  return withSolution(sites.length, terms, columns);
}

function withSolution(sites: number, terms: DiscTerm[], columns: Float64Array[]): SurfaceFit {
  const leverage = new Float64Array(sites);
  if (terms.length === 0) {
    return { sites, terms, columns, solution: [], leverage, unscaledVariance: new Float64Array(0) };
  }
  const covariance = inverse(gram(columns));
  const solution = columns.map((_, k) => {
    const row = new Float64Array(sites);
    columns.forEach((column, j) => {
      const factor = covariance.get(k, j);
      for (let i = 0; i < sites; i++) row[i]! += factor * column[i]!;
    });
    return row;
  });
  solution.forEach((row, k) => {
    for (let i = 0; i < sites; i++) leverage[i]! += row[i]! * columns[k]![i]!;
  });
  return {
    sites,
    terms,
    columns,
    solution,
    leverage,
    unscaledVariance: Float64Array.from(covariance.diagonal()),
  };
}

/** The coefficients of the fit for one wafer's readings, in the order of its sites. */
export function fitCoefficients(fit: SurfaceFit, readings: Float64Array): Float64Array {
  const coefficients = new Float64Array(fit.terms.length);
  for (let k = 0; k < coefficients.length; k++) {
    const row = fit.solution[k]!;
    let sum = 0;
    for (let i = 0; i < readings.length; i++) sum += row[i]! * readings[i]!;
    coefficients[k] = sum;
  }
  return coefficients;
}

/** What the surface with these coefficients leaves of the readings. */
export function fitResiduals(
  fit: SurfaceFit,
  readings: Float64Array,
  coefficients: Float64Array,
): Float64Array {
  const residuals = readings.slice();
  for (let k = 0; k < coefficients.length; k++) {
    const column = fit.columns[k]!;
    const coefficient = coefficients[k]!;
    for (let i = 0; i < residuals.length; i++) residuals[i]! -= coefficient * column[i]!;
  }
  return residuals;
}
