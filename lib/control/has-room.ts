import type { LimitSet } from './limit-set';

/**
 * Whether limits leave room about their centre line: those of levels that are all equal, or differ in their last bits
 * only, do not, and judge nothing.
 *
 * @example hasRoom(limitSet([1, 1, 1].map((level) => ({ level, within: null, between: null, wafers: 1 })))) // false
 */
export function hasRoom({ level: { lower, centre, upper } }: LimitSet): boolean {
  return lower < centre && centre < upper;
}
