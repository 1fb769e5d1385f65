import type { Completion } from './completions-at';
import { isBeyond } from './is-beyond';
import type { MovingRangeEstimator } from './moving-range-sigma';
import type { RuleName } from './rule';

/** What σ was estimated from; `given` where it was not. */
export type SigmaSource =
  MovingRangeEstimator | 'mean-range' | 'mean-s' | 'pooled-s' | 'log-spread' | 'given';

/** One signal of a study: points are counted from 1, the completing point is the one that is marked. */
export interface StudySignal {
  point: number;
  rule: RuleName;
  side: 'above' | 'below';
  participants: number[];
}

/**
 * One chart of a control study. `sigma` is the standard deviation of what is plotted, so that classical limits are
 * centre ± 3 sigma (not below zero for a spread). A figure that differs from point to point, as it does with
 * subgroups of unequal size, is a list with one entry a point; null where the point is not judged.
 */
export interface StudyChart {
  name:
    'level' | 'range' | 's' | 'moving-range' | 'between' | 'within' | 'ewma' | 'cusum-above' | 'cusum-below';
  /** What σ came from: for `within` of a three-way chart by probability the logarithms of the spreads. */
  estimator: SigmaSource;
  centre: number | (number | null)[];
  upper: number | (number | null)[];
  lower: number | (number | null)[];
  sigma: number | (number | null)[];
  points: (number | null)[];
  signals: StudySignal[];
}

/**
 * What a study may choose. `baseline`: the first so many points set the limits (all by default). `estimator`: of those
 * that the kind of chart knows. `spreadRules`: rules of the chart of the spread within subgroups, beside its limits.
 */
export interface StudyOptions {
  rules: readonly RuleName[];
  limits: 'classical' | 'probability';
  baseline?: number;
  estimator?: SigmaSource;
  spreadRules?: readonly RuleName[];
}

/**
 * The estimator that a chart was asked to use, of those it knows; the first where none was asked for. Throws
 * `RangeError` for one it does not know.
 */
export function estimatorOf<E extends SigmaSource>(
  asked: SigmaSource | undefined,
  known: readonly [E, ...E[]],
): E {
  const found = asked === undefined ? known[0] : known.find((name) => name === asked);
  if (found === undefined)
    throw new RangeError(`σ of this chart comes from ${known.join(' or ')}, not ${asked}`);
  return found;
}

/** The completion as a signal, its points counted from 1. */
export function studySignal({ index, rule, side, participants }: Completion): StudySignal {
  return { point: index + 1, rule, side, participants: participants.map((i) => i + 1) };
}

/** A list whose entries are all the same number, as that number. */
export function oneOrMany(list: readonly (number | null)[]): number | (number | null)[] {
  const [first] = list;
  return typeof first === 'number' && list.every((value) => value === first) ? first : [...list];
}

/** Signals of a chart that is judged by its limits alone. */
export function limitSignals(
  points: readonly (number | null)[],
  lower: readonly (number | null)[],
  upper: readonly (number | null)[],
): StudySignal[] {
  return points.flatMap((value, i): StudySignal[] => {
    const [low, high] = [lower[i] ?? null, upper[i] ?? null];
    const signal = (side: 'above' | 'below') => [
      { point: i + 1, rule: 'beyond-limit', side, participants: [i + 1] },
    ];
    if (value === null) return [];
    if (high !== null && isBeyond(value, high, 'above')) return signal('above');
    return low !== null && isBeyond(value, low, 'below') ? signal('below') : [];
  });
}

/** The part of the points that sets the limits. Throws `RangeError` unless it is a whole number from 2 to all. */
export function baselineOf<T>(points: readonly T[], baseline: number | undefined): readonly T[] {
  if (points.length < 2) throw new RangeError(`a study needs at least two points, not ${points.length}`);
  const size = baseline ?? points.length;
  if (!Number.isInteger(size) || size < 2 || size > points.length) {
    throw new RangeError(
      `the baseline must be a whole number from 2 to the ${points.length} points there are`,
    );
  }
  return points.slice(0, size);
}
