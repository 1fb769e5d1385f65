/** The steps of a map's scale: `edges` are the values where the colour changes, ascending and evenly spaced. */
export interface MapLevels {
  edges: number[];
  step: number;
  /** Decimals that tell the edges apart. */
  decimals: number;
}

const STEPS = [1, 2, 2.5, 5, 10];

/** A pattern smaller than this share of its distance from zero cannot be seen on a scale with zero. */
const LEAST_PATTERN = 0.25;

/**
 * An even scale in round steps over the given values, up to twelve of them; maps shown side by side share one
 * made from all their values. A scale of differences has zero among its edges and reaches no farther on either
 * side than the values do; where they all lie so far on one side that zero would leave their pattern under three
 * steps, it covers them alone. Values that are all equal get a scale around them.
 *
 * @throws RangeError when a value is not finite or there is none.
 * @example mapLevels([9.83, 10.21], 'value').edges // 9.8, 9.85 … 10.25
 */
export function mapLevels(values: readonly number[], mode: 'value' | 'difference'): MapLevels {
  if (values.length === 0 || !values.every(Number.isFinite))
    throw new RangeError('A scale needs finite values');
  let least = Math.min(...values);
  let most = Math.max(...values);
  if (mode === 'difference' && !isFarFromZero(least, most)) {
    least = Math.min(0, least);
    most = Math.max(0, most);
  }
  const size = Math.max(Math.abs(least), Math.abs(most));
  if (most - least <= Math.max(1e-9 * size, 1e-12)) {
    const around = size > 1e-9 ? 0.001 * size : 1;
    least -= around;
    most += around;
  }
  const rough = (most - least) / 10;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = power * (STEPS.find((s) => s * power >= rough * (1 - 1e-9)) ?? 10);
  const first = Math.floor(least / step + 1e-9);
  const last = Math.ceil(most / step - 1e-9);
  const decimals = decimalsOf(step);
  const edges = Array.from({ length: last - first + 1 }, (_, i) =>
    Number(((first + i) * step).toFixed(decimals)),
  );
  return { edges, step, decimals };
}

/** Whether differences lie on one side of zero, farther from it than a scale with zero can show their pattern. */
export function isFarFromZero(least: number, most: number): boolean {
  const reach = Math.max(Math.abs(least), Math.abs(most));
  return least * most > 0 && most > least && most - least < LEAST_PATTERN * reach;
}

/**
 * Where one step of a scale lies on the path of colours, 0…1: values run along it evenly; differences keep their
 * zero in the middle and equal sizes of either sign equally far from it. On a scale without zero they run along
 * the half of the path that is their sign's.
 */
export function stepShare(levels: MapLevels, index: number, mode: 'value' | 'difference'): number {
  const steps = levels.edges.length - 1;
  const edge = levels.edges[index];
  if (edge === undefined || index >= steps) throw new RangeError(`There is no step ${index} of ${steps}`);
  if (mode === 'value') return steps === 1 ? 0.5 : index / (steps - 1);
  if ((levels.edges[0] ?? 0) > 0) return 0.5 + (0.5 * (index + 1)) / steps;
  if ((levels.edges.at(-1) ?? 0) < 0) return (0.5 * index) / steps;
  const reach = Math.max(...levels.edges.map(Math.abs)) - levels.step / 2;
  return Math.max(0, Math.min(1, 0.5 + (0.5 * (edge + levels.step / 2)) / reach));
}

function decimalsOf(step: number): number {
  for (let decimals = 0; decimals < 20; decimals++) {
    if (Math.abs(Number(step.toFixed(decimals)) - step) < 1e-6 * step) return decimals;
  }
  return 20;
}
