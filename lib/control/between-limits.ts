import { c4 } from '@/lib/stats/c4';
import { chiSquareQuantile } from '@/lib/stats/chi-square';
import { standardNormalCdf } from '@/lib/stats/standard-normal';
import type { LimitSet, SubgroupPoint } from './limit-set';

/** The share of a normal distribution inside three σ, 99.73 %. */
const INSIDE = 1 - 2 * standardNormalCdf(-3);

/**
 * Limits of the standard deviation between the wafers of a subgroup: σ pooled over all subgroups of two wafers or
 * more, centre c4·σ, upper limit at the 99.73 % point of chi-square (NIST/SEMATECH e-Handbook, section 7.2.3, for
 * the distribution of s²). The figures hold for the commonest number of wafers. Null where no subgroup has two.
 *
 * Throws `RangeError` for a spread that is negative or not finite.
 */
export function betweenLimits(baseline: readonly SubgroupPoint[]): LimitSet['between'] {
  let squares = 0;
  let freedom = 0;
  const sizes = new Map<number, number>();
  for (const { between, wafers } of baseline) {
    if (between === null || wafers < 2) continue;
    if (!(between >= 0 && Number.isFinite(between)))
      throw new RangeError('a spread between is a number from zero up');
    squares += (wafers - 1) * between * between;
    freedom += wafers - 1;
    sizes.set(wafers, (sizes.get(wafers) ?? 0) + 1);
  }
  const [wafers] = [...sizes].sort(([a, m], [b, n]) => n - m || a - b)[0] ?? [];
  if (wafers === undefined) return null;
  const sigma = Math.sqrt(squares / freedom);
  const { centre, upper } = factorsOf(wafers);
  return { centre: centre * sigma, upper: upper * sigma, wafers };
}

const known = new Map<number, { centre: number; upper: number }>();

/** Centre line and upper limit of the spread between so many wafers, for σ = 1. */
function factorsOf(wafers: number): { centre: number; upper: number } {
  const found = known.get(wafers);
  if (found !== undefined) return found;
  const upper = Math.sqrt(chiSquareQuantile(INSIDE, wafers - 1) / (wafers - 1));
  const factors = { centre: c4(wafers), upper };
  known.set(wafers, factors);
  return factors;
}

/**
 * Centre line and upper limit of the spread between the wafers of a subgroup of the given size, from limits that were
 * set for the usual size: the same σ, c4 and the chi-square point of this many wafers.
 *
 * Throws `RangeError` unless `wafers` is a whole number of at least 2.
 */
export function betweenLimitsFor(
  limits: NonNullable<LimitSet['between']>,
  wafers: number,
): { centre: number; upper: number } {
  if (!Number.isInteger(wafers) || wafers < 2) throw new RangeError(`no spread between ${wafers} wafers`);
  const { centre, upper, wafers: usual } = limits;
  if (usual === undefined || usual === wafers) return { centre, upper };
  const [from, to] = [factorsOf(usual), factorsOf(wafers)];
  return { centre: (centre / from.centre) * to.centre, upper: (upper / from.upper) * to.upper };
}
