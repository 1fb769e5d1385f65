import { expectedBand, levelAgainstExpected } from './level-against-expected';
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
 * The level of a stream's newest charted subgroup against what was expected of its wafers, as the stream's page says
 * it. Null without a level or an expected value, and outside the conversion.
 */
export function boardExpected(stream: BoardStream): BoardExpected | null {
  const { target, charted, chartedValue } = stream;
  if (target === null || charted === null) return null;
  const { expected: value, uncertaintyPercent, ingotFraction } = charted;
  const model = targetModel(target.target, ingotFraction);
  const expected = { targetId: target.id, value, uncertaintyPercent, model };
  const level = stream.points.findLast((point) => point.level !== null)?.level ?? null;
  const against = levelAgainstExpected(level, expected, chartedValue);
  const band = expectedBand(expected, chartedValue);
  if (against?.dopant == null || band === null) return null;
  return {
    differencePercent: against.differencePercent,
    dopantPercent: against.dopant.percent,
    uncertaintyPercent,
    uncertaintyDopantPercent: against.dopant.uncertaintyPercent,
    tolerancePercent: target.target.tolerancePercent,
    charted: band,
  };
}
