type Span = readonly [number, number];

/**
 * A smooth function of two arguments that is costly, interpolated by a polynomial through Chebyshev points of the
 * second kind over a rectangle (barycentric form, J.-P. Berrut and L. N. Trefethen, SIAM Review 46, 501 (2004)).
 * `counts` are the points along each argument. For use inside the rectangle.
 *
 * Throws `RangeError` unless both spans run from a lower to a higher finite number and both counts are 2 or more.
 */
export function chebyshevSurface(
  f: (x: number, y: number) => number,
  xSpan: Span,
  ySpan: Span,
  [xCount, yCount]: readonly [number, number],
): (x: number, y: number) => number {
  const [xs, ys] = [points(xSpan, xCount), points(ySpan, yCount)];
  const values = xs.map((x) => ys.map((y) => f(x, y)));
  return (x, y) =>
    interpolated(
      xs,
      values.map((row) => interpolated(ys, row, y)),
      x,
    );
}

function points([low, high]: Span, count: number): number[] {
  if (!(low < high && Number.isFinite(low) && Number.isFinite(high)))
    throw new RangeError('a span from low to high');
  if (!Number.isInteger(count) || count < 2) throw new RangeError(`two points or more, not ${count}`);
  return Array.from(
    { length: count },
    (_, i) => (low + high) / 2 - ((high - low) / 2) * Math.cos((Math.PI * i) / (count - 1)),
  );
}

function interpolated(places: readonly number[], values: readonly number[], at: number): number {
  let above = 0;
  let below = 0;
  for (let i = 0; i < places.length; i++) {
    const [place, value] = [places[i] ?? 0, values[i] ?? 0];
    if (at === place) return value;
    const end = i === 0 || i === places.length - 1 ? 0.5 : 1;
    const weight = ((i % 2 === 0 ? 1 : -1) * end) / (at - place);
    above += weight * value;
    below += weight;
  }
  return above / below;
}
