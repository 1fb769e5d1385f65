import { mean } from '@/lib/stats/mean';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { partOfPlan, type PlanGeometry } from './plan-geometry';
import { waferShape } from './wafer-shape';

/** A wafer measured before: its readings in the plan's order, and which of them count. */
export interface PastWafer {
  values: readonly (number | null)[];
  badSites: readonly number[];
}

/** How far one shape usually goes on wafers of this stream, in percent of the mean. */
export interface UsualShape {
  name: string;
  wafers: number;
  percent: number;
  /** From wafer to wafer, one sample standard deviation. */
  spreadPercent: number;
}

/** What wafers of a stream usually look like, whatever their level. */
export interface UsualMap {
  wafers: number;
  /** For each site the mean of reading over wafer mean; null where no wafer has a good reading. */
  ratios: (number | null)[];
  shapes: UsualShape[];
}

/** Fewer wafers than this are not yet a habit. */
export const LEAST_USUAL_WAFERS = 5;

/**
 * The usual map of a stream: each wafer's good readings over their own mean, averaged site by site, and the mean and
 * spread of each shape term over the same wafers. Null from fewer than five wafers with a positive mean.
 *
 * Throws RangeError where a wafer has not as many readings as the plan has sites.
 */
export function usualMap(past: readonly PastWafer[], geometry: PlanGeometry): UsualMap | null {
  const sites = geometry.sites.length;
  const sums = new Float64Array(sites);
  const counts = new Int32Array(sites);
  const shapes = new Map<string, number[]>();
  let wafers = 0;
  for (const { values, badSites } of past) {
    if (values.length !== sites) throw new RangeError(`${values.length} readings for ${sites} sites`);
    const isGood = new Uint8Array(sites);
    for (let i = 0; i < sites; i++) isGood[i] = Number.isFinite(values[i] ?? NaN) ? 1 : 0;
    for (const site of badSites) isGood[site] = 0;
    for (let i = 0; i < sites; i++) if (geometry.excluded[i] === 1) isGood[i] = 0;
    const part = partOfPlan(geometry, isGood);
    const readings = Float64Array.from(part.indices, (site) => values[site] as number);
    const level = readings.length === 0 ? 0 : mean(readings);
    if (!(level > 0)) continue;
    wafers++;
    part.indices.forEach((site, i) => {
      sums[site]! += readings[i]! / level;
      counts[site]!++;
    });
    for (const { name, percent } of waferShape(readings, part, level).terms) {
      const known = shapes.get(name);
      if (known) known.push(percent);
      else shapes.set(name, [percent]);
    }
  }
  if (wafers < LEAST_USUAL_WAFERS) return null;
  return {
    wafers,
    ratios: Array.from(sums, (sum, site) => (counts[site] === 0 ? null : sum / counts[site]!)),
    shapes: [...shapes].flatMap(([name, percents]) => usualShape(name, percents) ?? []),
  };
}

function usualShape(name: string, percents: readonly number[]): UsualShape | null {
  if (percents.length < LEAST_USUAL_WAFERS) return null;
  const spreadPercent = sampleStandardDeviation(percents) ?? 0;
  return { name, wafers: percents.length, percent: mean(percents), spreadPercent };
}
