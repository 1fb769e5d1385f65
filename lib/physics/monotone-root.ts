/**
 * Where a continuous function that changes sign between `lower` and `upper` is zero, by the Illinois variant of
 * false position (Dowell and Jarratt, BIT 11, 168 (1971)): always bracketed, and a handful of steps where the
 * function is nearly straight, as resistivity against doping is on logarithmic axes.
 *
 * `lower` and `upper` in the unit of the argument; the answer to `tolerance` in that unit. Null when the two ends
 * have the same sign. Throws RangeError when the ends are not finite or not in order.
 *
 * @example monotoneRoot((x) => x * x - 2, 0, 2, 1e-12) // 1.41421356…
 */
export function monotoneRoot(
  f: (x: number) => number,
  lower: number,
  upper: number,
  tolerance: number,
): number | null {
  if (!Number.isFinite(lower) || !Number.isFinite(upper) || lower > upper) {
    throw new RangeError(`A bracket runs from a lower to an upper finite number, not ${lower} to ${upper}.`);
  }
  let [a, b] = [lower, upper];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (fa > 0 === fb > 0) return null;
  for (let step = 0; step < 200; step++) {
    // Every third step halves the bracket, so that a curved function cannot make the method crawl.
    const c = step % 3 === 2 ? (a + b) / 2 : (a * fb - b * fa) / (fb - fa);
    const fc = f(c);
    if (fc === 0) return c;
    if (fc > 0 === fb > 0) fa /= 2;
    else [a, fa] = [b, fb];
    [b, fb] = [c, fc];
    if (Math.abs(a - b) <= tolerance) return b;
  }
  return b;
}
