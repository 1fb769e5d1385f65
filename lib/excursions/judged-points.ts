import { completionsAt, LOOK_BACK, type ChartPoint, type Completion } from '@/lib/control/completions-at';
import type { Line, LineLimits, LinePoint } from './line';

/** The points of a line that stand on its charts: those with a level, without a newest subgroup still incomplete. */
export function chartedPoints(line: Line): LinePoint[] {
  return line.points.filter((point, index) => point.level !== null && !isOpen(line, index));
}

/** Whether the subgroup still waits for wafers: it is the newest of its stream, and smaller than the stream's size. */
export function isOpen(line: Line, index: number): boolean {
  const point = line.points[index];
  return index === line.points.length - 1 && point !== undefined && point.members.length < line.subgroupSize;
}

/** The limit revision in force at a position: the latest that took effect before it. */
export function limitsInForce(limits: readonly LineLimits[], at: number): LineLimits | null {
  let found: LineLimits | null = null;
  for (const revision of limits) {
    if (revision.effectiveFrom >= at) continue;
    const later =
      found === null ||
      revision.effectiveFrom > found.effectiveFrom ||
      (revision.effectiveFrom === found.effectiveFrom && revision.revision > found.revision);
    if (later) found = revision;
  }
  return found;
}

/**
 * Judges the charted points from index `from` on, and writes what it finds into them: the moving range (never across
 * a restart), the limits in force, and the rules each completes. Returns the completions, by index among `charted`.
 */
export function judgedPoints(line: Line, charted: readonly LinePoint[], from: number): Completion[] {
  const segment = (at: number) => line.restarts.filter((restart) => restart <= at).length;
  const start = Math.max(0, from - LOOK_BACK - 1);
  const window: ChartPoint[] = [];
  const completions: Completion[] = [];
  let segmentBefore = -1;
  for (let index = start; index < charted.length; index += 1) {
    const point = charted[index] as LinePoint;
    const level = point.level as number;
    const here = segment(point.at);
    if (index >= from) {
      const before = charted[index - 1];
      const across =
        before === undefined || (segmentBefore === -1 ? segment(before.at) : segmentBefore) !== here;
      point.movingRange = across ? null : Math.abs(level - (before.level as number));
      point.limits = limitsInForce(line.limits, point.at);
    }
    segmentBefore = here;
    window.push({
      level,
      within: point.within,
      between: point.between,
      wafers: point.members.length,
      movingRange: point.movingRange,
      limits: point.limits?.limits ?? null,
      regime: `${point.limits?.revision ?? 0}/${here}`,
    });
    if (index < from) continue;
    const found = completionsAt(window, index - start).map((completion) => ({
      ...completion,
      index,
      participants: completion.participants.map((participant) => participant + start),
    }));
    point.completions = found.map(({ chart, rule, side }) => `${chart}:${rule}:${side}`);
    completions.push(...found);
  }
  return completions;
}
