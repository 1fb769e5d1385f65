import { type LimitAge, limitAge } from './limit-age';
import type { LimitSet } from './limit-set';

/**
 * How far a revision of limits can be trusted: provisional until someone approves it, then by the size of its
 * baseline (`limitAge`).
 *
 * Throws `RangeError` unless the baseline's size is a whole number from zero up.
 *
 * @example limitsState({ state: 'provisional', limits: { n: 200, … } }) // 'provisional'
 */
export function limitsState(revision: { state: string; limits: Pick<LimitSet, 'n'> }): LimitAge {
  return revision.state === 'provisional' ? 'provisional' : limitAge(revision.limits.n);
}
