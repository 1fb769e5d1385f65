/** One shape on the unit disc: radial order, angular order, and which of the two orientations. */
export interface DiscTerm {
  name: string;
  radialOrder: number;
  angularOrder: number;
  direction: 'cos' | 'sin';
}

/** A term alone, or the two orientations of one shape, which a rotation mixes. */
export type DiscTermGroup = readonly DiscTerm[];

function pair(radialOrder: number, angularOrder: number, along: string, across: string): DiscTermGroup {
  return [
    { name: along, radialOrder, angularOrder, direction: 'cos' },
    { name: across, radialOrder, angularOrder, direction: 'sin' },
  ];
}

function round(radialOrder: number, name: string): DiscTermGroup {
  return [{ name, radialOrder, angularOrder: 0, direction: 'cos' }];
}

/**
 * The shapes a wafer is described by, in the order in which a plan takes them up: the circle
 * polynomials of Zernike to the fourth order (Born and Wolf, Principles of Optics, section 9.2,
 * from memory), each at most ±1 on the disc and +1 at its highest place on the rim. So a bowl of
 * 1 % lies 1 % high at the rim and 1 % low in the centre: 2 % from centre to rim.
 */
export const SHAPE_TERMS: readonly DiscTermGroup[] = [
  round(0, 'level'),
  pair(1, 1, 'tilt along x', 'tilt along y'),
  round(2, 'bowl'),
  pair(2, 2, 'saddle on the axes', 'saddle on the diagonals'),
  round(4, 'ring'),
  pair(3, 1, 'bent tilt along x', 'bent tilt along y'),
  pair(3, 3, 'three-fold along x', 'three-fold along y'),
  pair(4, 2, 'bent saddle on the axes', 'bent saddle on the diagonals'),
  pair(4, 4, 'four-fold on the axes', 'four-fold between the axes'),
];

/** The shapes of the smooth surface that readings are screened against: the same, on to the sixth order. */
export const SCREEN_TERMS: readonly DiscTermGroup[] = [
  ...SHAPE_TERMS,
  round(6, 'second ring'),
  pair(5, 1, 'order 5, 1 along x', 'order 5, 1 along y'),
  pair(5, 3, 'order 5, 3 along x', 'order 5, 3 along y'),
  pair(5, 5, 'order 5, 5 along x', 'order 5, 5 along y'),
  pair(6, 2, 'order 6, 2 on the axes', 'order 6, 2 between'),
  pair(6, 4, 'order 6, 4 on the axes', 'order 6, 4 between'),
  pair(6, 6, 'order 6, 6 on the axes', 'order 6, 6 between'),
];

function factorial(n: number): number {
  return n < 2 ? 1 : n * factorial(n - 1);
}

/**
 * The value of one term at a place on the unit disc (x, y in units of its radius):
 * R(r)·cos(mθ) or R(r)·sin(mθ) with the radial polynomial
 * R = Σ (-1)^s (n-s)! / (s! ((n+m)/2-s)! ((n-m)/2-s)!) r^(n-2s).
 *
 * @example discTermValue({ name: 'bowl', radialOrder: 2, angularOrder: 0, direction: 'cos' }, 0, 0) // -1
 */
export function discTermValue(term: DiscTerm, x: number, y: number): number {
  const { radialOrder: n, angularOrder: m } = term;
  const radius = Math.hypot(x, y);
  let radial = 0;
  for (let s = 0; s <= (n - m) / 2; s++) {
    const weight =
      factorial(n - s) / (factorial(s) * factorial((n + m) / 2 - s) * factorial((n - m) / 2 - s));
    radial += (s % 2 === 0 ? weight : -weight) * radius ** (n - 2 * s);
  }
  if (m === 0) return radial;
  const angle = Math.atan2(y, x);
  return radial * (term.direction === 'cos' ? Math.cos(m * angle) : Math.sin(m * angle));
}
