import type { NormalSource } from './chance-stream';
import type { RuleName } from './rule';
import { ruleWalk } from './rule-walk';
import { simulatedRunLength, type SimulatedRunLength } from './simulated-run-length';

/**
 * Values that follow each other, x = ρ·x + noise, the mean moved by `shift` of their long-run σ, and what the limits
 * took for σ: the long-run standard deviation, or the moving ranges, which see only √(1 − ρ) of it.
 */
export interface FollowingValues {
  lagOne: number;
  shift?: number;
  sigma?: 'long-run' | 'moving-range';
}

/**
 * The average run length of a chart judged by rules when each value foretells the next (first-order autoregression),
 * by simulation with its standard error; each run begins anywhere in the long run. What limits from moving ranges
 * cost where values follow each other is the reason not to use them there: L. C. Alwan and H. V. Roberts, J. Business
 * & Economic Statistics 6, 87 (1988).
 *
 * Throws `RangeError` unless −1 < ρ < 1, for a shift that is not finite, fewer than two runs, and unknown rules.
 */
export function followingRunLength(
  rules: readonly RuleName[],
  { lagOne, shift = 0, sigma = 'long-run' }: FollowingValues,
  source: NormalSource,
  runs = 4000,
): SimulatedRunLength {
  if (!(lagOne > -1 && lagOne < 1)) throw new RangeError(`no long run with a correlation of ${lagOne}`);
  if (!Number.isFinite(shift)) throw new RangeError(`no shift of ${shift} σ`);
  const walk = ruleWalk(rules);
  const noise = Math.sqrt(1 - lagOne * lagOne);
  const scale = sigma === 'long-run' ? 1 : Math.sqrt(1 - lagOne);
  return simulatedRunLength(() => {
    walk.restart();
    let value = source.normal();
    return () => {
      const signals = walk.signals((shift + value) / scale);
      value = lagOne * value + noise * source.normal();
      return signals;
    };
  }, runs);
}
