import type { LimitSet } from '@/lib/control/limit-set';
import type { BoardLimits, BoardStream } from './types';

/** The last levels of a stream in units of the limits they were judged by. */
export interface BoardStrip {
  points: { z: number | null; signal: boolean; open: boolean }[];
  /** By what the levels are measured: limits that judge, or, while there are none, the levels' own scatter. */
  limits: 'provisional' | 'approved' | null;
}

/**
 * Levels as (level − centre)/σ, each by the limits it was judged by. Points of the first baseline were judged by none:
 * they are drawn by the first revision, which they made themselves. A stream without any limits is drawn about its own
 * mean, in units of its mean moving range, so that its course shows; no limits are drawn then.
 */
export function boardStrip(stream: Pick<BoardStream, 'points' | 'limits'>): BoardStrip {
  const { points, limits } = stream;
  const [first, inForce] = [limits[0], limits.at(-1)];
  const byId = new Map(limits.map((revision) => [revision.id, revision]));
  const own = ownScale(points.map((point) => point.level).filter((level) => level !== null));
  return {
    points: points.map((point) => {
      const judgedBy = (point.limitsId === null ? null : byId.get(point.limitsId)) ?? first;
      const scale = judgedBy?.limits.level ?? own;
      const z = point.level === null ? null : (point.level - scale.centre) / scale.sigma;
      return { z, signal: point.levelCalls, open: point.state === 'open' };
    }),
    limits: inForce?.state ?? null,
  };
}

/** The limits of the newest point of the strip, by which bands beside it are drawn. */
export function limitsInForce(stream: Pick<BoardStream, 'limits'>): BoardLimits | null {
  return stream.limits.at(-1) ?? null;
}

/** Mean and mean moving range over 1.128 (d2 of two, ISO 7870-2:2013); of levels that do not vary, a unit scale. */
function ownScale(levels: readonly number[]): Pick<LimitSet['level'], 'centre' | 'sigma'> {
  if (levels.length === 0) return { centre: 0, sigma: 1 };
  const centre = levels.reduce((total, level) => total + level / levels.length, 0);
  let steps = 0;
  for (let i = 1; i < levels.length; i += 1) {
    steps += Math.abs((levels[i] as number) - (levels[i - 1] as number));
  }
  const sigma = levels.length < 2 ? 0 : steps / (levels.length - 1) / 1.128;
  return { centre, sigma: sigma > 0 ? sigma : 1 };
}
