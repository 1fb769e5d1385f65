import type { CusumDesign } from './cusum-run-length';

/** Both arms of a tabular CUSUM, in σ, neither below zero. */
export interface CusumState {
  above: number;
  below: number;
}

/** A CUSUM before its first value. */
export const CUSUM_BEGIN: CusumState = { above: 0, below: 0 };

/**
 * The arms after one more value z, in σ from the target: C₊ = max(0, C₊ + z − k) and C₋ = max(0, C₋ − z − k)
 * (E. S. Page, Biometrika 41, 100 (1954); NIST/SEMATECH e-Handbook, section 6.3.2.3).
 *
 * @example nextCusum(CUSUM_BEGIN, 2, { reference: 0.5, decision: 5 }).above // 1.5
 */
export function nextCusum({ above, below }: CusumState, z: number, { reference }: CusumDesign): CusumState {
  return { above: Math.max(0, above + z - reference), below: Math.max(0, below - z - reference) };
}
