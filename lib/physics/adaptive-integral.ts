function simpson(fa: number, fm: number, fb: number, width: number): number {
  return (width / 6) * (fa + 4 * fm + fb);
}

/**
 * The integral of a function from `lower` to `upper` by adaptive Simpson quadrature with Richardson's correction
 * (Lyness, J. ACM 16, 483 (1969)), to a relative `tolerance` of the first estimate.
 *
 * A step inside the interval is met by halving down to 2⁻³⁰ of the interval, no further. Throws RangeError when
 * the ends are not finite.
 *
 * @example adaptiveIntegral((x) => x * x, 0, 3, 1e-9) // 9
 */
export function adaptiveIntegral(
  f: (x: number) => number,
  lower: number,
  upper: number,
  tolerance: number,
): number {
  if (!Number.isFinite(lower) || !Number.isFinite(upper)) {
    throw new RangeError(`An integral runs between finite numbers, not ${lower} and ${upper}.`);
  }
  const part = (
    a: number,
    b: number,
    fa: number,
    fm: number,
    fb: number,
    whole: number,
    error: number,
    depth: number,
  ): number => {
    const m = (a + b) / 2;
    const fl = f((a + m) / 2);
    const fr = f((m + b) / 2);
    const left = simpson(fa, fl, fm, m - a);
    const right = simpson(fm, fr, fb, b - m);
    const difference = left + right - whole;
    if (depth <= 0 || Math.abs(difference) <= 15 * error) return left + right + difference / 15;
    return (
      part(a, m, fa, fl, fm, left, error / 2, depth - 1) + part(m, b, fm, fr, fb, right, error / 2, depth - 1)
    );
  };
  const strips = 8;
  const width = (upper - lower) / strips;
  const first = Array.from({ length: strips }, (_, i) => {
    const a = lower + i * width;
    const values: [number, number, number] = [f(a), f(a + width / 2), f(a + width)];
    return { a, values, whole: simpson(...values, width) };
  });
  const error = (tolerance * Math.abs(first.reduce((sum, s) => sum + s.whole, 0))) / strips;
  return first.reduce((sum, s) => sum + part(s.a, s.a + width, ...s.values, s.whole, error, 30), 0);
}
