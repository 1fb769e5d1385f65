import { expectedValue, type Expected } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
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
 * wafer. Dopant percent is the difference divided by d ln value / d ln density. Null without a target or a level, and
 * outside the conversion.
 */
export function boardExpected(stream: BoardStream): BoardExpected | null {
  const { target, charted, chartedValue } = stream;
  const level = stream.points.findLast((point) => point.level !== null)?.level ?? null;
  if (target === null || charted === null || level === null) return null;
  const model = modelOf(target.id, target.target, charted.ingotFraction);
  if (model === null || model.sensitivity === 0) return null;
  const measuredAgainst = charted.targetId === target.id ? charted.expected : null;
  const value = measuredAgainst ?? model.value;
  const isRelative = chartedValue === 'relative';
  if (!isRelative && value === null) return null;
  const differencePercent = isRelative
    ? 100 * Math.expm1(level / 100)
    : 100 * (level / (value as number) - 1);
  const { uncertaintyPercent, sensitivity } = model;
  const share = uncertaintyPercent / 100;
  return {
    differencePercent,
    dopantPercent: differencePercent / sensitivity,
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

type Model = Pick<Expected, 'uncertaintyPercent' | 'sensitivity'> & { value: number | null };

/** A target revision never changes, and working out a diffused layer takes milliseconds: each is worked out once. */
const known = new Map<string, Model | null>();
const MOST_KNOWN = 2000;

function modelOf(targetId: string, target: Target, ingotFraction: number | null): Model | null {
  const key = JSON.stringify([targetId, target, target.alongCrystal ? ingotFraction : null]);
  const found = known.get(key);
  if (found !== undefined) return found;
  const model = worked(target, ingotFraction);
  if (known.size >= MOST_KNOWN) known.clear();
  known.set(key, model);
  return model;
}

/** A layer whose thickness each wafer brings has no value of its own; its sensitivity does not depend on thickness. */
function worked(target: Target, ingotFraction: number | null): Model | null {
  const wafer: ExpectedWafer = { ingotFraction };
  const missing = missingForExpected(target, wafer);
  if (missing === 'ingotFraction') return null;
  try {
    const given = missing === 'layerThicknessUm' ? { ...wafer, layerThicknessUm: 1 } : wafer;
    const { value, uncertaintyPercent, sensitivity } = expectedValue(target, given);
    return { value: missing === null ? value : null, uncertaintyPercent, sensitivity };
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
