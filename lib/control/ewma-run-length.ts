import type { AbsorbingChain } from './absorbing-chain';
import { cellChain, partBelow } from './cell-chain';
import { extrapolated } from './extrapolated';
import type { RunLengthOptions } from './rule-run-length';

/** An EWMA chart: the weight λ of the newest value, and its steady limits in σ of what is plotted. */
export interface EwmaDesign {
  lambda: number;
  width: number;
}

/**
 * The average run length of an EWMA chart with steady limits, for independent normal values: the mean number of
 * points to the first signal, that point included. `shift` and `spread` in the σ that the limits were drawn with.
 *
 * A Markov chain over intervals between the limits (D. Brook and D. A. Evans, Biometrika 59, 539 (1972); J. M.
 * Lucas and M. S. Saccucci, Technometrics 32, 1 (1990)), at two fineness and extrapolated to none: agrees with the
 * integral equation of S. V. Crowder, Technometrics 29, 401 (1987), to 3e-4 of its value from λ = 0.05 up and to 1.1e-3
 * at 0.01. `zero`: the chart begins
 * on the target. `steady`: it ran long without a signal before the shift came. With limits that widen from the
 * start, run lengths are a little shorter; those are simulated (`simulatedRunLength`).
 *
 * Throws `RangeError` unless 0.01 ≤ λ ≤ 1 and 0 < width, or for a shift or spread that makes no sense, or limits so
 * wide that the run length has no figure.
 *
 * @example ewmaRunLength({ lambda: 0.1, width: 2.814 }) // about 500
 */
export function ewmaRunLength(
  design: EwmaDesign,
  { shift = 0, spread = 1, start = 'zero' }: RunLengthOptions = {},
): number {
  if (!(design.lambda >= 0.01 && design.lambda <= 1))
    throw new RangeError(`λ lies between 0.01 and 1, not at ${design.lambda}`);
  if (!(design.width > 0 && Number.isFinite(design.width)))
    throw new RangeError(`no limits at ${design.width} σ`);
  if (!Number.isFinite(shift)) throw new RangeError(`no shift of ${shift} σ`);
  if (!(spread > 0 && Number.isFinite(spread))) throw new RangeError(`no spread of ${spread} σ`);
  const once = (half: number): number => {
    const size = 2 * half + 1;
    const steps = chainOf(design, size, shift, spread).steps();
    if (start === 'zero') return steps[half] ?? 0;
    const standing = chainOf(design, size, 0, spread).standing();
    return standing.reduce((sum, share, state) => sum + share * (steps[state] ?? 0), 0);
  };
  const length = extrapolated((size) => once((size - 1) / 2), 41, 83);
  if (!Number.isFinite(length)) throw new RangeError('the run length is too long for a figure');
  return Math.max(1, length);
}

function chainOf({ lambda, width }: EwmaDesign, size: number, shift: number, spread: number): AbsorbingChain {
  const limit = width * Math.sqrt(lambda / (2 - lambda));
  const step = (2 * limit) / size;
  return cellChain(size, (from, edge) => {
    const before = -limit + (from + 0.5) * step;
    return partBelow(((-limit + edge * step - (1 - lambda) * before) / lambda - shift) / spread);
  });
}
