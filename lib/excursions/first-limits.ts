import { limitSet } from '@/lib/control/limit-set';
import { judgedWafers } from './judged-points';
import { FIRST_BASELINE, type Line, type LineLimits, type LinePoint } from './line';

/**
 * The limits that the first 25 charted subgroups of a stream propose by themselves, as long as it has none. They
 * judge what comes after them. Null without a whole line or enough points, and where these do not vary at all.
 */
export function firstLimits(line: Line, charted: readonly LinePoint[]): LineLimits | null {
  if (line.limits.length > 0 || !line.whole || charted.length < FIRST_BASELINE) return null;
  const baseline = charted.slice(0, FIRST_BASELINE);
  const limits = limitSet(
    baseline.map((point) => ({
      level: point.level as number,
      within: point.within,
      between: point.between,
      wafers: judgedWafers(point),
    })),
  );
  if (limits.level.sigma === 0) return null;
  return {
    id: null,
    revision: 1,
    effectiveFrom: (baseline.at(-1) as LinePoint).at,
    supersededFrom: null,
    baselineIds: baseline.map((point) => point.id),
    limits,
  };
}
