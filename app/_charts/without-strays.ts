/**
 * The values an axis must hold when a few stray far from all others: `values` without those that lie further from the
 * bulk of them, and from the `lines` drawn beside them, than that bulk is wide. The bulk leaves 2 % aside at each end,
 * so what a stream does for long is never a stray. With fewer than 20 values, or none astray, all of them.
 *
 * Strays are still drawn, at the edge of the axis and with their value: one wafer of another recipe must not flatten
 * two hundred others.
 *
 * @throws RangeError when a value or line is not finite.
 * @example withoutStrays([...Array(30).keys(), 1000], []).length // 30
 */
export function withoutStrays(values: readonly number[], lines: readonly number[]): number[] {
  if (![...values, ...lines].every(Number.isFinite)) throw new RangeError('An axis needs finite numbers');
  if (values.length < 20) return [...values];
  const sorted = values.toSorted((a, b) => a - b);
  const aside = Math.max(1, Math.floor(values.length * 0.02));
  const bulk = [sorted[aside] as number, sorted[values.length - 1 - aside] as number, ...lines];
  const [low, high] = [Math.min(...bulk), Math.max(...bulk)];
  const width = high - low;
  return width === 0 ? [...values] : values.filter((value) => value >= low - width && value <= high + width);
}
