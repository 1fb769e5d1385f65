import { mean } from '@/lib/stats/mean';
import { quantile } from '@/lib/stats/quantile';
import type { NormalSource } from './chance-stream';
import { runLengthsOf, type ChartDesign } from './chart-run-length';
import { chebyshevSurface } from './chebyshev-surface';
import { MEAN_RANGE_OF_TWO } from './moving-range-factors';

/** Signals a point with limits that were estimated: the mean over baselines, and where the middle 80 % of them lie. */
export interface ConditionalRate {
  perPoint: number;
  low: number;
  high: number;
}

/**
 * Signals a point of a chart of levels alone when centre and σ come from a baseline of n points, σ from the mean moving
 * range: for each of many baselines the exact rate, one over its average run length, given how far its limits
 * miss. C. P. Quesenberry, J. Quality Technology 25, 237 (1993), for why it matters. `shift`, in true σ, is
 * that of the mean after the baseline.
 *
 * The exact rate is computed at a few dozen places and interpolated between them (Chebyshev), so that thousands of
 * baselines cost little. `source` is seeded.
 *
 * Throws `RangeError` for a baseline under 5 points, fewer than 20 baselines, a shift that is not finite, and for
 * what `chartRunLength` refuses.
 */
export function conditionalRate(
  design: ChartDesign,
  baseline: number,
  source: NormalSource,
  { shift = 0, baselines = 2000 }: { shift?: number; baselines?: number } = {},
): ConditionalRate {
  if (!Number.isInteger(baseline) || baseline < 5)
    throw new RangeError(`no rate from a baseline of ${baseline}`);
  if (!Number.isInteger(baselines) || baselines < 20)
    throw new RangeError(`20 baselines or more, not ${baselines}`);
  if (!Number.isFinite(shift)) throw new RangeError(`no shift of ${shift} σ`);
  const runLength = runLengthsOf(design);
  const misses = Array.from({ length: baselines }, () => missOf(baseline, source));
  const seen = misses.map(({ centre, sigma }) => ({
    offset: (shift - centre) / sigma,
    logSpread: -Math.log(sigma),
  }));
  const logRate = chebyshevSurface(
    (offset, logSpread) => -Math.log(runLength({ shift: offset, spread: Math.exp(logSpread) })),
    rangeOf(seen.map(({ offset }) => offset)),
    rangeOf(seen.map(({ logSpread }) => logSpread)),
    [9, 7],
  );
  const rates = seen.map(({ offset, logSpread }) => Math.min(1, Math.exp(logRate(offset, logSpread))));
  return { perPoint: mean(rates), low: quantile(rates, 0.1), high: quantile(rates, 0.9) };
}

/** Centre and σ as a baseline of standard normal values gives them. */
function missOf(baseline: number, source: NormalSource): { centre: number; sigma: number } {
  let sum = 0;
  let ranges = 0;
  let before: number | null = null;
  for (let i = 0; i < baseline; i++) {
    const value = source.normal();
    sum += value;
    if (before !== null) ranges += Math.abs(value - before);
    before = value;
  }
  return { centre: sum / baseline, sigma: ranges / (baseline - 1) / MEAN_RANGE_OF_TWO };
}

function rangeOf(values: readonly number[]): readonly [number, number] {
  return values.reduce<[number, number]>(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [Infinity, -Infinity],
  );
}
