/** Places of the 15 points on −1…1, from the outermost to the middle, the 7 of the coarse rule being every second one. */
const PLACES = [
  0.991455371120812639206854697526329, 0.949107912342758524526189684047851,
  0.864864423359769072789712788640926, 0.741531185599394439863864773280788, 0.586087235467691130294144691693,
  0.405845151377397166906606412076961, 0.207784955007898467600689403773245, 0,
] as const;
const FINE = [
  0.02293532201052922496373200805897, 0.063092092629978553290700663189204,
  0.104790010322250183839876322541518, 0.140653259715525918745189590510238,
  0.16900472663926790282658342659855, 0.190350578064785409913256402421014,
  0.204432940075298892414161999234649, 0.209482141084727828012999174891714,
] as const;
const COARSE = [
  0, 0.129484966168869693270611432679082, 0, 0.27970539148927666790146777142378, 0,
  0.381830050505118944950369775488975, 0, 0.417959183673469387755102040816327,
] as const;

/** Halvings after which a piece is taken as it is: a step inside it then counts for next to nothing. */
const DEEPEST = 30;

/** The 15-point value over one piece, and how far it may be off. */
function piece(f: (x: number) => number, a: number, b: number): { value: number; error: number } {
  const [middle, half] = [(a + b) / 2, (b - a) / 2];
  let [fine, coarse] = [0, 0];
  const values: number[] = [];
  for (let i = 0; i < PLACES.length; i++) {
    const offset = half * (PLACES[i] ?? 0);
    const sum = i === PLACES.length - 1 ? f(middle) : f(middle - offset) + f(middle + offset);
    values.push(sum);
    fine += (FINE[i] ?? 0) * sum;
    coarse += (COARSE[i] ?? 0) * sum;
  }
  const mean = fine / 2;
  const roughness = values.reduce(
    (sum, value, i) => sum + (FINE[i] ?? 0) * Math.abs(value - mean * (i === PLACES.length - 1 ? 1 : 2)),
    0,
  );
  const apart = Math.abs(fine - coarse);
  const error = roughness === 0 ? apart : roughness * Math.min(1, ((200 * apart) / roughness) ** 1.5);
  return { value: fine * half, error: error * Math.abs(half) };
}

/**
 * The integral of a function from `lower` to `upper` by adaptive Gauss–Kronrod quadrature with 7 and 15 points
 * (R. Piessens and others, QUADPACK, Springer 1983, with its estimate of the error), to a relative `tolerance` of the
 * first estimate; halved where the estimate is larger.
 *
 * A step inside the interval is met by halving down to 2⁻³⁰ of it, no further. Throws RangeError when the ends are not
 * finite.
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
  const part = (a: number, b: number, allowed: number, depth: number): number => {
    const { value, error } = piece(f, a, b);
    if (error <= allowed || depth <= 0) return value;
    const middle = (a + b) / 2;
    return part(a, middle, allowed / 2, depth - 1) + part(middle, b, allowed / 2, depth - 1);
  };
  const first = piece(f, lower, upper);
  const allowed = tolerance * Math.abs(first.value);
  if (first.error <= allowed) return first.value;
  const middle = (lower + upper) / 2;
  return part(lower, middle, allowed / 2, DEEPEST) + part(middle, upper, allowed / 2, DEEPEST);
}
