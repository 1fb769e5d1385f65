/**
 * The range of a chart's vertical axis: all of `core` (points and limits) and a margin, widened for each of the
 * `wishes` (the expected band, the tolerance) in turn unless that would squeeze what was measured into less than
 * 1/`most` of the height. `from` sets the lower end, as 0 does for ranges and
 * spreads, with half a margin under it so that a mark on it stays whole.
 *
 * @throws RangeError when a number is not finite.
 * @example chartDomain([1, 2], [], { margin: 0 }) // [1, 2]
 */
export function chartDomain(
  core: readonly number[],
  wishes: readonly (readonly number[])[] = [],
  options: { margin?: number; most?: number; from?: number } = {},
): [number, number] {
  const { margin = 0.08, most = 2.2, from } = options;
  if (![...core, ...wishes.flat()].every(Number.isFinite))
    throw new RangeError('An axis needs finite numbers');
  let [low, high] = core.length > 0 ? ends(core) : wishes[0] !== undefined ? ends(wishes[0]) : [0, 1];
  const widest = (high - low) * most;
  for (const wish of wishes) {
    const [wishLow, wishHigh] = ends([...wish, low, high]);
    if (wishHigh - wishLow <= widest) [low, high] = [wishLow, wishHigh];
  }
  if (high === low) {
    const room = Math.abs(low) > 0 ? Math.abs(low) * 0.01 : 1;
    [low, high] = [low - room, high + room];
  }
  const room = (high - low) * margin;
  if (from === undefined) return [low - room, high + room];
  return [from - ((high - from) * margin) / 2, high + (high - from) * margin];
}

const ends = (values: readonly number[]): [number, number] => {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return low <= high ? [low, high] : [0, 1];
};
