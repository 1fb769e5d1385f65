import type { AbsorbingChain } from './absorbing-chain';
import { cellChain, partBelow } from './cell-chain';
import { cusumSteadyRunLength } from './cusum-steady-run-length';
import { extrapolated } from './extrapolated';
import type { RunLengthOptions } from './rule-run-length';

/** A tabular CUSUM on both sides: reference value k and decision interval h, both in σ. */
export interface CusumDesign {
  reference: number;
  decision: number;
}

/**
 * The average run length of a two-sided tabular CUSUM begun at zero, for independent normal values: the mean number
 * of points to the first signal, that point included. `shift` and `spread` in the σ of the design.
 *
 * Each arm is a Markov chain over intervals from 0 to h (D. Brook and D. A. Evans, Biometrika 59, 539 (1972)), at
 * two fineness and extrapolated to none; both arms together by 1/L = 1/L₊ + 1/L₋ (K. W. Kemp, J. R. Statist. Soc. B
 * 23, 149 (1961)). `steady`, after long running without a signal, follows both arms at once: `cusumSteadyRunLength`.
 *
 * An arm that by D. Siegmund's approximation (Sequential Analysis, Springer 1985) signals less than once in 1e10
 * points is left out.
 *
 * Throws `RangeError` unless k ≥ 0 and 0 < h ≤ 50, or for a shift or spread that makes no sense, or a run length
 * too long for a figure.
 *
 * @example cusumRunLength({ reference: 0.5, decision: 5 }) // 465
 */
export function cusumRunLength(
  design: CusumDesign,
  { shift = 0, spread = 1, start = 'zero' }: RunLengthOptions = {},
): number {
  const { reference, decision } = design;
  if (!(reference >= 0 && Number.isFinite(reference)))
    throw new RangeError(`no reference value of ${reference} σ`);
  if (!(decision > 0 && decision <= 50)) throw new RangeError(`no decision interval of ${decision} σ`);
  if (!Number.isFinite(shift)) throw new RangeError(`no shift of ${shift} σ`);
  if (!(spread > 0 && Number.isFinite(spread))) throw new RangeError(`no spread of ${spread} σ`);
  if (start === 'steady') return cusumSteadyRunLength(design, shift, spread);
  const rate = [shift, -shift].reduce((sum, toward) => {
    if (2 * (reference - toward) * (decision + 1.166) > 28 * spread * spread) return sum;
    return sum + 1 / extrapolated((size) => armChain(design, size, toward, spread).steps()[0] ?? 0, 50, 100);
  }, 0);
  if (rate === 0) throw new RangeError('the run length is too long for a figure');
  return Math.max(1, 1 / rate);
}

/** The chain of one arm: state 0 holds zero and half an interval above it, as Brook and Evans have it. */
function armChain(
  { reference, decision }: CusumDesign,
  size: number,
  shift: number,
  spread: number,
): AbsorbingChain {
  const step = (2 * decision) / (2 * size - 1);
  // Only how far an edge lies from the cell matters.
  const below = Float64Array.from({ length: 2 * size + 1 }, (_, i) =>
    partBelow(((i - size - 0.5) * step + reference - shift) / spread),
  );
  return cellChain(size, (from, edge) => (edge === 0 ? 0 : (below[edge - from + size] ?? 0)));
}
