import { limitSet } from '@/lib/control/limit-set';
import { judgedWafers } from './judged-points';
import { FIRST_BASELINE, type Line, type LineLimits, type LinePoint } from './line';

/**
 * The limits that the first 25 charted subgroups of a stream propose by themselves, as long as it has none. They
 * judge what comes after them. Where those 25 levels are all equal no limits come of them (a stuck gauge, a value
 * typed once for all): then the 25 count that begin with the last of the equal ones.
 *
 * Null without a whole line or enough points.
 */
export function firstLimits(line: Line, charted: readonly LinePoint[]): LineLimits | null {
  if (line.limits.length > 0 || !line.whole) return null;
  const varied = firstChange(charted);
  const start = varied < FIRST_BASELINE ? 0 : varied - 1;
  const baseline = charted.slice(start, start + FIRST_BASELINE);
  if (baseline.length < FIRST_BASELINE) return null;
  const limits = limitSet(
    baseline.map((point) => ({
      level: point.level as number,
      within: point.within,
      between: point.between,
      wafers: judgedWafers(point),
    })),
  );
  return {
    id: null,
    revision: 1,
    effectiveFrom: (baseline.at(-1) as LinePoint).at,
    supersededFrom: null,
    baselineIds: baseline.map((point) => point.id),
    limits,
  };
}

/**
 * Whether first limits may come of points that are not the whole line: only then the whole is worth loading. While
 * levels stay equal none come, and where they varied earlier for as long as a baseline, limits are there already.
 */
export function mayPropose(line: Line, charted: readonly LinePoint[]): boolean {
  return line.limits.length === 0 && firstChange(charted) < charted.length;
}

/** Levels that differ by less, relatively, are equal: they differ by how they were added up. */
const ALIKE = 1e-12;

/** The index of the first level that differs from those before it; the number of points where all are equal. */
function firstChange(charted: readonly LinePoint[]): number {
  const first = charted[0]?.level ?? 0;
  const found = charted.findIndex(
    ({ level }) => Math.abs((level as number) - first) > ALIKE * Math.abs(first),
  );
  return found === -1 ? charted.length : found;
}
