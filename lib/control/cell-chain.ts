import { standardNormalCdf } from '@/lib/stats/standard-normal';
import { absorbingChain, type AbsorbingChain } from './absorbing-chain';

/**
 * The chain of a statistic that takes continuous values, cut into cells between its limits: `line(from, edge)` is the
 * standard normal value that carries it from the middle of cell `from` to the given edge, edges counted from 0 to
 * `size`; what goes beyond the last (or below the first) ends the chain. D. Brook and D. A. Evans, Biometrika 59,
 * 539 (1972).
 */
export function cellChain(size: number, line: (from: number, edge: number) => number): AbsorbingChain {
  const kept = new Float64Array(size * size);
  for (let from = 0; from < size; from++) {
    let lower = below(line(from, 0));
    for (let to = 0; to < size; to++) {
      const upper = below(line(from, to + 1));
      kept[from * size + to] = upper - lower;
      lower = upper;
    }
  }
  return absorbingChain(kept, size);
}

/** Beyond 9 σ nothing is left that a sum with 1 could hold. */
function below(z: number): number {
  return z <= -9 ? 0 : z >= 9 ? 1 : standardNormalCdf(z);
}
