import type { ComponentLevel } from './variance-components';

/** The chart for a stream, and how many times too narrow limits from the spread within its groups would be. */
export interface ChartThatFits {
  chart: 'individuals' | 'mean-s' | 'three-way' | 'nested';
  /** Square root of F of the outermost level, at least 1; null where there is no F. */
  tooNarrow: number | null;
}

/**
 * Which chart the components of a stream ask for. Groups whose means differ by no more than what is within them explains
 * (F of the outermost level is not significant at 5 %) have limits from the spread within: mean and s. Where they differ
 * by more, such limits are too narrow by √F, and the means are charted as individuals with the spread within beside:
 * three-way (D. J. Wheeler and D. S. Chambers, Understanding Statistical Process Control, from memory), or nested where
 * there are groups within the groups. Single values are individuals.
 *
 * `levels` from the outermost to the innermost, as `varianceComponents` gives them. Throws `RangeError` without any.
 */
export function chartThatFits(levels: readonly Pick<ComponentLevel, 'f' | 'p'>[]): ChartThatFits {
  const [outermost] = levels;
  if (!outermost) throw new RangeError('no level, no chart');
  const { f, p } = outermost;
  if (levels.length === 1) return { chart: 'individuals', tooNarrow: null };
  const differ = p === null || p < 0.05;
  const chart = !differ ? 'mean-s' : levels.length === 2 ? 'three-way' : 'nested';
  return { chart, tooNarrow: f === null ? null : Math.sqrt(Math.max(1, f)) };
}
