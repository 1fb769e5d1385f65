import { standardNormalCdf } from '@/lib/stats/standard-normal';
import { absorbingChain, type AbsorbingChain } from './absorbing-chain';

/**
 * The chain of a statistic that takes continuous values, cut into cells between its limits: `below(from, edge)` is
 * the chance to come from the middle of cell `from` below the given edge, edges counted from 0 to `size`; what goes
 * beyond the last (or below the first) ends the chain. D. Brook and D. A. Evans, Biometrika 59,
 * 539 (1972).
 */
export function cellChain(size: number, below: (from: number, edge: number) => number): AbsorbingChain {
  const kept = new Float64Array(size * size);
  for (let from = 0; from < size; from++) {
    let lower = below(from, 0);
    for (let to = 0; to < size; to++) {
      const upper = below(from, to + 1);
      kept[from * size + to] = upper - lower;
      lower = upper;
    }
  }
  return absorbingChain(kept, size);
}

/** The part of a standard normal distribution below z; beyond 9 σ nothing is left that a sum with 1 could hold. */
export function partBelow(z: number): number {
  return z <= -9 ? 0 : z >= 9 ? 1 : standardNormalCdf(z);
}
