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

/**
 * The limit revision in force at a position: the latest that took effect before it. A provisional one judges until
 * another is approved, and nothing from the instant on at which that one takes force, though its own lies later.
 */
export function limitsInForce<
  Revision extends Pick<LineLimits, 'revision'> &
    Record<'effectiveFrom', Instant> &
    Record<'supersededFrom', Instant | null>,
>(limits: readonly Revision[], at: number): Revision | null {
  let found: Revision | null = null;
  for (const revision of limits) {
    const from = Number(revision.effectiveFrom);
    if (from >= at || (revision.supersededFrom !== null && Number(revision.supersededFrom) < at)) continue;
    const before = Number(found?.effectiveFrom ?? -Infinity);
    if (found === null || from > before || (from === before && revision.revision > found.revision))
      found = revision;
  }
  return found;
}

/** Milliseconds since 1970, or a date. */
type Instant = number | Date;

/** The wafers of a subgroup that its figures rest on: a wafer that is not judged is there, but does not count. */
export function judgedWafers(point: Pick<LinePoint, 'members'>): number {
  let wafers = 0;
  for (const { level } of point.members) if (level !== null) wafers += 1;
  return wafers;
}

/**
 * Judges the charted points from index `from` on, and writes what it finds into them: the moving range (never across
 * a restart), the limits in force, and the rules each completes. Returns the completions, by index among `charted`.
 */
export function judgedPoints(line: Line, charted: readonly LinePoint[], from: number): Completion[] {
  const start = Math.max(0, from - LOOK_BACK);
  const window: ChartPoint[] = [];
  const completions: Completion[] = [];
  let before: { level: number; segment: number } | null = null;
  for (let index = start; index < charted.length; index += 1) {
    const point = charted[index] as LinePoint;
    const level = point.level as number;
    const segment = segmentAt(line.restarts, point.at);
    if (index >= from) {
      point.movingRange = before?.segment === segment ? Math.abs(level - before.level) : null;
      point.limits = limitsInForce(line.limits, point.at);
    }
    before = { level, segment };
    window.push({
      level,
      within: point.within,
      between: point.between,
      wafers: judgedWafers(point),
      movingRange: point.movingRange,
      limits: point.limits?.limits ?? null,
      regime: `${point.limits?.revision ?? 0}/${segment}`,
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

/** How many restarts came before a position: points of different segments are never held against each other. */
function segmentAt(restarts: readonly number[], at: number): number {
  let segment = 0;
  for (const restart of restarts) if (restart <= at) segment += 1;
  return segment;
}
