import { Matrix, solve } from 'ml-matrix';
import type { NestedLevels } from './nested-levels';
import { restrictedLikelihood, type RestrictedLikelihood } from './restricted-likelihood';

/** A variance below this part of all is taken as zero. */
const NOTHING = 1e-9;

/**
 * The variances of groups within groups by restricted maximum likelihood, outermost first: never negative, and with
 * unequal groups of less scatter than the analysis of variance. Equal to that with equal groups unless one of its
 * estimates is negative.
 *
 * Steps of minorization that always climb (H. Zhou, L. Hu, J. Zhou and K. Lange, J. Computational and Graphical
 * Statistics 28, 350 (2019)), then Newton's on the logarithms of the variances, to twelve digits. A variance that falls
 * to nothing is set to zero, and the slope there is made sure of.
 *
 * `null` where the values within groups do not differ, or a level has no degree of freedom of its own.
 */
export function remlComponents(levels: NestedLevels): number[] | null {
  const { groups, innermost } = levels;
  const identified = groups.every((level, j) => level.length > (groups[j - 1]?.length ?? 1));
  const values = groups.at(-1) ?? [];
  const total = values.reduce((sum, { mean }) => sum + mean * mean, 0);
  const within = innermost.reduce((sum, { squares }) => sum + squares, 0);
  if (!identified || !(within > 1e-20 * total)) return null;
  const unit = total / values.length;
  let variances = groups.map(() => unit / groups.length);
  for (let round = 0; round <= groups.length; round++) {
    variances = climbed(levels, variances, 10);
    variances = sharpened(levels, variances, unit).map((v) => (v < NOTHING * unit ? 0 : v));
    const { cost, pull } = restrictedLikelihood(levels, variances);
    const wanted = variances.map((v, k) => v === 0 && (pull[k] ?? 0) > (cost[k] ?? 0));
    if (!wanted.includes(true)) break;
    variances = variances.map((v, k) => (wanted[k] ? unit / 100 : v));
  }
  return variances;
}

function climbed(levels: NestedLevels, from: readonly number[], steps: number): number[] {
  let variances = [...from];
  for (let step = 0; step < steps; step++) {
    const { cost, pull } = restrictedLikelihood(levels, variances);
    variances = variances.map((v, k) => v * Math.sqrt(Math.max(0, pull[k] ?? 0) / (cost[k] ?? 1)));
  }
  return variances;
}

/** Newton's steps on the logarithms of the variances that are not nothing, each shortened until it climbs. */
function sharpened(levels: NestedLevels, from: readonly number[], unit: number): number[] {
  let variances = [...from];
  for (let step = 0; step < 60; step++) {
    const free = variances.flatMap((v, k) => (v > NOTHING * unit ? [k] : []));
    variances = variances.map((v, k) => (free.includes(k) ? v : 0));
    const here = restrictedLikelihood(levels, variances);
    const slopeOf = (list: readonly number[], { cost, pull }: RestrictedLikelihood): number[] =>
      free.map((k) => (list[k] ?? 0) * ((cost[k] ?? 0) - (pull[k] ?? 0)));
    const slope = (list: readonly number[]): number[] => slopeOf(list, restrictedLikelihood(levels, list));
    const level = slopeOf(variances, here);
    const scale = free.map((k) => (variances[k] ?? 0) * (here.cost[k] ?? 1));
    if (level.every((g, i) => Math.abs(g) < 1e-13 * (scale[i] ?? 1))) break;
    const curved = free.map((k) => {
      const moved = (factor: number): number[] => slope(variances.map((v, m) => (m === k ? v * factor : v)));
      const [up, down] = [moved(Math.exp(1e-5)), moved(Math.exp(-1e-5))];
      return up.map((g, i) => (g - (down[i] ?? 0)) / 2e-5);
    });
    const direction = newtonStep(curved, level, scale);
    let reach = Math.min(1, 3 / Math.max(...direction.map(Math.abs)));
    const at = (part: number): number[] =>
      variances.map((v, k) =>
        free.includes(k) ? v * Math.exp(-part * (direction[free.indexOf(k)] ?? 0)) : 0,
      );
    const allowed = here.value + 1e-9 * Math.abs(here.value);
    while (reach > 1e-6 && restrictedLikelihood(levels, at(reach)).value > allowed) reach /= 2;
    variances = at(reach);
    if (reach * Math.max(...direction.map(Math.abs)) < 1e-12) break;
  }
  return variances;
}

/** The step of Newton where the curvature is that of a minimum, else one along the slope. */
function newtonStep(curvature: number[][], slope: number[], scale: number[]): number[] {
  const plain = slope.map((g, i) => g / (scale[i] ?? 1));
  const matrix = new Matrix(curvature);
  const symmetric = Matrix.add(matrix, matrix.transpose()).div(2);
  const step = solve(symmetric, Matrix.columnVector(slope), true).to1DArray();
  const climbs = step.reduce((sum, d, i) => sum + d * (slope[i] ?? 0), 0) > 0;
  return climbs && step.every(Number.isFinite) ? step : plain;
}
