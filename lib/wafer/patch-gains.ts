import type { SitePatches } from './site-patches';

/**
 * What each patch explains: the F ratio of the squares that go when its sites are left out of the plain fit,
 * Q = e'(I - H)⁻¹e over its sites, to the mean square of what stays (Gentleman and Wilk, Biometrics 31, 387 (1975),
 * from memory). `residuals` are those of the plain fit. A patch that leaves nothing explains everything: Infinity
 * is kept out by counting at least 1e-12 of the squares as left.
 */
export function patchGains(
  residuals: Float64Array,
  { members, deletions }: SitePatches,
  terms: number,
): Float64Array {
  let squares = 0;
  for (const residual of residuals) squares += residual * residual;
  const gains = new Float64Array(members.length);
  const own = new Float64Array(residuals.length);
  let at = 0;
  for (let patch = 0; patch < gains.length; patch++) {
    const sites = members[patch]!;
    const size = sites.length;
    let gone = 0;
    for (let a = 0; a < size; a++) {
      own[a] = residuals[sites[a]!]!;
      let sum = 0;
      for (let b = 0; b <= a; b++) sum += deletions[at++]! * own[b]!;
      gone += sum * own[a]!;
    }
    const left = Math.max(squares - gone, 1e-12 * squares);
    const freedom = residuals.length - terms - size;
    gains[patch] = freedom > 0 && left > 0 ? ((gone / size) * freedom) / left : 0;
  }
  return gains;
}
