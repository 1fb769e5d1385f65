/** The steps of a map's scale: `edges` are the values where the colour changes, ascending and evenly spaced. */
export interface MapLevels {
  edges: number[];
  step: number;
  /** Decimals that tell the edges apart. */
  decimals: number;
}

const STEPS = [1, 2, 2.5, 5, 10];

/**
 * An even scale in round steps over the given values, six to twelve of them; maps shown side by side share
 * one made from all their values. A scale of differences has the same reach on both sides and zero among
 * its edges. Values that are all equal get a scale around them.
 *
 * @throws RangeError when a value is not finite or there is none.
 * @example mapLevels([9.83, 10.21], 'value').edges // 9.8, 9.85 … 10.25
 */
export function mapLevels(values: readonly number[], mode: 'value' | 'difference'): MapLevels {
  if (values.length === 0 || !values.every(Number.isFinite))
    throw new RangeError('A scale needs finite values');
  const reach = Math.max(...values.map(Math.abs));
  let least = mode === 'difference' ? -reach : Math.min(...values);
  let most = mode === 'difference' ? reach : Math.max(...values);
  if (most - least <= 1e-9 * reach || most === least) {
    const around = reach > 0 ? 0.001 * reach : 1;
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

function decimalsOf(step: number): number {
  for (let decimals = 0; decimals < 20; decimals++) {
    if (Math.abs(Number(step.toFixed(decimals)) - step) < 1e-6 * step) return decimals;
  }
  return 20;
}
