import { monotoneRoot } from '@/lib/physics/monotone-root';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';
import { ewmaRunLength, type EwmaDesign } from './ewma-run-length';
import { assertWanted, type Wanted } from './wanted';

/**
 * The EWMA that sees the wanted shift soonest among those with the wanted mean number of points between false
 * signals: for each λ from 0.02 to 1 the width that gives it, and the λ whose run length at the shift is the
 * shortest, to about a twentieth of itself (S. V. Crowder, J. Quality Technology 21, 155 (1989), for this way to
 * choose, from memory).
 *
 * Throws `RangeError` unless 10 ≤ inControl ≤ 100 000 and 0.1 ≤ |shift| ≤ 6.
 */
export function ewmaFor(wanted: Wanted): EwmaDesign {
  assertWanted(wanted);
  const { shift } = wanted;
  const at = (place: number): { design: EwmaDesign; length: number } => {
    const lambda = Math.exp(place);
    const design = { lambda, width: ewmaWidthFor(lambda, wanted.inControl, 1e-3) };
    return { design, length: ewmaRunLength(design, { shift }) };
  };
  let [low, high] = [Math.log(0.02), 0];
  const golden = (Math.sqrt(5) - 1) / 2;
  let [left, right] = [at(high - golden * (high - low)), at(low + golden * (high - low))];
  while (high - low > 0.1) {
    if (left.length <= right.length) {
      high = low + golden * (high - low);
      [right, left] = [left, at(high - golden * (high - low))];
    } else {
      low = high - golden * (high - low);
      [left, right] = [right, at(low + golden * (high - low))];
    }
  }
  const { lambda } = (left.length <= right.length ? left : right).design;
  return { lambda, width: ewmaWidthFor(lambda, wanted.inControl) };
}

/**
 * The limits, in σ of what is plotted, that give an EWMA of weight λ the wanted mean number of points between false
 * signals, to `tolerance` σ. Throws `RangeError` unless 0.01 ≤ λ ≤ 1 and 10 ≤ inControl ≤ 100 000.
 *
 * @example ewmaWidthFor(0.1, 500) // 2.81
 */
export function ewmaWidthFor(lambda: number, inControl: number, tolerance = 1e-4): number {
  assertWanted({ inControl, shift: 1 });
  const excess = (width: number): number => Math.log(ewmaRunLength({ lambda, width }) / inControl);
  // At the same width an EWMA runs longer than the values themselves, so theirs is the widest.
  const widest = -standardNormalQuantile(0.5 / inControl);
  const width = monotoneRoot(excess, Math.max(0.1, widest - 1.6), widest + 0.01, tolerance);
  if (width === null) throw new RangeError(`no width gives ${inControl} points at λ = ${lambda}`);
  return width;
}
