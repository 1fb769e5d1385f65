import type { ChartPoint } from './completions-at';
import { isBeyond } from './is-beyond';
import type { Rule } from './rule';

/** The points of a completed pattern, the completing one last, and the half of the chart it belongs to. */
export interface Pattern {
  side: 'above' | 'below';
  participants: number[];
}

/**
 * The pattern of one rule on the level chart that the point at `index` completes and takes part in, or null. Points
 * before `start` do not count. Each point is held against its own limits.
 *
 * The side of a pattern that uses both halves is that of the completing point; of a trend, `above` where it rises;
 * of an alternation, `above` where its last step rises.
 *
 * Throws `RangeError` when a level it looks at is not finite.
 */
export function patternAt(
  points: readonly ChartPoint[],
  start: number,
  index: number,
  rule: Rule,
): Pattern | null {
  const from = Math.max(start, index - rule.of + 1);
  for (let i = from; i <= index; i++) {
    if (!Number.isFinite(points[i]?.level)) throw new RangeError(`point ${i} has no finite level`);
  }
  if (rule.kind === 'limit') return limitPattern(points, index);
  if (rule.kind === 'zone') return zonePattern(points, from, index, rule.need, rule.sigma);
  if (index - from + 1 < rule.of) return null;
  if (rule.kind === 'within' || rule.kind === 'mixture') {
    const holds = rule.kind === 'within' ? allWithin : mixtureHolds;
    if (!holds(points, from, index, rule.sigma)) return null;
    const centre = points[index]?.limits?.level.centre ?? 0;
    return { side: level(points, index) >= centre ? 'above' : 'below', participants: span(from, index) };
  }
  const rises = level(points, index) > level(points, index - 1);
  const turns = rule.kind === 'alternating';
  for (let i = from + 1; i <= index; i++) {
    const step = level(points, i) - level(points, i - 1);
    const upward = turns && (index - i) % 2 === 1 ? !rises : rises;
    if (upward ? !(step > 0) : !(step < 0)) return null;
  }
  return { side: rises ? 'above' : 'below', participants: span(from, index) };
}

function level(points: readonly ChartPoint[], i: number): number {
  return points[i]?.level ?? 0;
}

function limitPattern(points: readonly ChartPoint[], index: number): Pattern | null {
  const limits = points[index]?.limits?.level;
  if (!limits) return null;
  const value = level(points, index);
  if (isBeyond(value, limits.upper, 'above')) return { side: 'above', participants: [index] };
  if (isBeyond(value, limits.lower, 'below')) return { side: 'below', participants: [index] };
  return null;
}

/** On which side of the zone line at `sigma` the point lies: null on the line, inside, or without limits. */
function sideBeyond(points: readonly ChartPoint[], i: number, sigma: number): 'above' | 'below' | null {
  const limits = points[i]?.limits?.level;
  if (!limits) return null;
  const value = level(points, i);
  if (isBeyond(value, limits.centre + sigma * limits.sigma, 'above')) return 'above';
  return isBeyond(value, limits.centre - sigma * limits.sigma, 'below') ? 'below' : null;
}

function zonePattern(
  points: readonly ChartPoint[],
  from: number,
  index: number,
  need: number,
  sigma: number,
): Pattern | null {
  const side = sideBeyond(points, index, sigma);
  if (!side || index - from + 1 < need) return null;
  const participants: number[] = [];
  for (let i = from; i <= index; i++) if (sideBeyond(points, i, sigma) === side) participants.push(i);
  return participants.length >= need ? { side, participants } : null;
}

/** Strictly inside the lines: a point on the line is neither within nor beyond. */
function allWithin(points: readonly ChartPoint[], from: number, index: number, sigma: number): boolean {
  for (let i = index; i >= from; i--) {
    const limits = points[i]?.limits?.level;
    if (!limits) return false;
    const value = level(points, i);
    const inside =
      isBeyond(value, limits.centre - sigma * limits.sigma, 'above') &&
      isBeyond(value, limits.centre + sigma * limits.sigma, 'below');
    if (!inside) return false;
  }
  return true;
}

function mixtureHolds(points: readonly ChartPoint[], from: number, index: number, sigma: number): boolean {
  let above = 0;
  for (let i = index; i >= from; i--) {
    const side = sideBeyond(points, i, sigma);
    if (!side) return false;
    if (side === 'above') above++;
  }
  return above > 0 && above < index - from + 1;
}

function span(from: number, to: number): number[] {
  return Array.from({ length: to - from + 1 }, (_, i) => from + i);
}
