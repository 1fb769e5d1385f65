import { componentInterval } from './component-interval';
import type { Interval } from './limit-interval';
import { nestedAnova, type AnovaRow } from './nested-anova';
import { nestedLevels, type NestedValue } from './nested-levels';
import { remlComponents } from './reml-components';

export type { NestedValue } from './nested-levels';

/** One level of the variation: its row of the analysis of variance, and its component. */
export interface ComponentLevel extends Omit<AnovaRow, 'error'> {
  /** The component by the analysis of variance, zero where its estimate is negative. */
  variance: number | null;
  /** 95 % interval of the component. */
  interval: Interval | null;
  /** The component by restricted maximum likelihood. */
  reml: number | null;
  /** Its share of all variation, in percent, by restricted maximum likelihood where there is one. */
  sharePercent: number | null;
}

export interface VarianceComponents {
  values: number;
  mean: number;
  /** Whether all groups of a level are of one size. */
  balanced: boolean;
  levels: ComponentLevel[];
}

/**
 * How much of the variation comes from where: from lot to lot, from wafer to wafer within lots, from site to site
 * within wafers. It says which spread control limits must be made of, and where better control would pay. See
 * `nestedAnova`, `remlComponents` and `componentInterval` for the methods and their sources.
 *
 * `names` name the groupings from the outermost to the innermost. What the data cannot give is null. Throws
 * `RangeError` as `nestedLevels` does.
 */
export function varianceComponents(
  rows: readonly NestedValue[],
  names: readonly string[],
): VarianceComponents {
  const nested = nestedLevels(rows, names);
  const reml = remlComponents(nested);
  const anova = nestedAnova(nested);
  const variances = anova.map(({ estimate }) => (estimate === null ? null : Math.max(0, estimate)));
  const parts = reml ?? variances;
  const all = parts.reduce((sum: number, part) => sum + (part ?? 0), 0);
  const known = all > 0 && !parts.includes(null);
  const sizes = nested.groups.map((level) => new Set(level.map(({ count }) => count)));
  return {
    values: rows.length,
    mean: nested.origin,
    balanced: sizes.every((counts) => counts.size === 1),
    levels: anova.map(({ error, ...row }, j) => {
      const { meanSquare, degreesOfFreedom, multiple } = row;
      const innermost = j === anova.length - 1;
      const hasInterval = meanSquare !== null && meanSquare > 0 && multiple !== null && (innermost || error);
      return {
        ...row,
        variance: variances[j] ?? null,
        interval: hasInterval
          ? componentInterval({ value: meanSquare, degreesOfFreedom }, error, multiple)
          : null,
        reml: reml?.[j] ?? null,
        sharePercent: known ? (100 * (parts[j] ?? 0)) / all : null,
      };
    }),
  };
}
