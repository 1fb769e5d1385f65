/**
 * A straight map from values to places on a drawing. Values outside the domain land outside the range unless `clamp`.
 *
 * @throws RangeError when the domain has no width or anything is not finite.
 * @example linearScale([-2, 2], [0, 100])(1) // 75
 */
export function linearScale(
  domain: readonly [number, number],
  range: readonly [number, number],
  options: { clamp?: boolean } = {},
): (value: number) => number {
  const width = domain[1] - domain[0];
  if (![...domain, ...range].every(Number.isFinite) || width === 0) {
    throw new RangeError('A scale needs finite ends and a domain of some width');
  }
  return (value) => {
    if (!Number.isFinite(value)) throw new RangeError('A value on a scale must be finite');
    const share = (value - domain[0]) / width;
    const kept = options.clamp ? Math.max(0, Math.min(1, share)) : share;
    return range[0] + kept * (range[1] - range[0]);
  };
}
