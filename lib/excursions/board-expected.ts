import { dopantPercent } from '@/lib/physics/dopant-percent';
import { targetModel } from './target-model';
import type { BoardStream } from './types';

/** The newest charted level against what physics expects, in percent of the value and as percent dopant. */
export interface BoardExpected {
  differencePercent: number;
  dopantPercent: number;
  /** Standard uncertainty (k = 1) of what is expected. */
  uncertaintyPercent: number;
  uncertaintyDopantPercent: number;
  /** The target's own, in percent of the dopant; null where none is agreed. */
  tolerancePercent: number | null;
  /** What is expected, as the charted value: on a relative chart that is nothing, 0. */
  charted: { lower: number; value: number; upper: number };
}

/**
 * The level of a stream's newest charted subgroup against expected. On a relative chart the level says it itself; else
 * it is held against what its wafers were expected to have by the latest target, or what that target expects of any
 * wafer. Null without a target or a level, and outside the conversion.
 */
export function boardExpected(stream: BoardStream): BoardExpected | null {
  const { target, charted, chartedValue } = stream;
  const level = stream.points.findLast((point) => point.level !== null)?.level ?? null;
  if (target === null || charted === null || level === null) return null;
  const model = targetModel(target.target, charted.ingotFraction);
  if (model === null) return null;
  const measuredAgainst = charted.targetId === target.id ? charted.expected : null;
  const value = measuredAgainst ?? model.value;
  const isRelative = chartedValue === 'relative';
  if (!isRelative && value === null) return null;
  const ratio = isRelative ? Math.exp(level / 100) : level / (value as number);
  const { uncertaintyPercent, sensitivity } = model;
  const dopant = dopantPercent(ratio, sensitivity);
  if (dopant === null) return null;
  const share = uncertaintyPercent / 100;
  return {
    differencePercent: 100 * (ratio - 1),
    dopantPercent: dopant,
    uncertaintyPercent,
    uncertaintyDopantPercent: Math.abs(uncertaintyPercent / sensitivity),
    tolerancePercent: target.target.tolerancePercent,
    charted: isRelative
      ? { lower: 100 * Math.log1p(-Math.min(share, 0.99)), value: 0, upper: 100 * Math.log1p(share) }
      : {
          lower: (value as number) * (1 - share),
          value: value as number,
          upper: (value as number) * (1 + share),
        },
  };
}
