/** How far limits can be trusted by the size of their baseline. */
export type LimitAge = 'provisional' | 'young' | 'established';

/**
 * The age of limits by the number of subgroups in their baseline: under 25 provisional, up to 100 young (their own
 * interval is worth drawing), above that established. 25 is common practice; that about 100 are needed before the
 * limits behave as if σ were known: C. P. Quesenberry, J. Quality Technology 25, 237 (1993), from memory.
 *
 * Throws `RangeError` unless n is a whole number from zero up.
 *
 * @example limitAge(25) // 'young'
 */
export function limitAge(n: number): LimitAge {
  if (!Number.isInteger(n) || n < 0) throw new RangeError(`not a number of subgroups: ${n}`);
  return n < 25 ? 'provisional' : n <= 100 ? 'young' : 'established';
}
