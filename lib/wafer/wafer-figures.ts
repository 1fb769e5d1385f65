import type { PlanGeometry } from './plan-geometry';
import type { PlanPart } from './plan-part';

/** A reading and the site where it was taken. */
export interface Extreme {
  value: number;
  siteIndex: number;
}

/** The figures of one wafer; each is null where it is not defined. `figureDefinition` says what each means. */
export interface WaferFigures {
  mean: number | null;
  areaMean: number | null;
  median: number | null;
  standardDeviation: number | null;
  relativeStandardDeviationPercent: number | null;
  fullRangeOverMidrangePercent: number | null;
  halfRangeOverMidrangePercent: number | null;
  halfRangeOverMeanPercent: number | null;
  radialVariationPercent: number | null;
  minimum: Extreme | null;
  maximum: Extreme | null;
}

/** The figures of a wafer without a good reading. */
export const NO_FIGURES: WaferFigures = {
  mean: null,
  areaMean: null,
  median: null,
  standardDeviation: null,
  relativeStandardDeviationPercent: null,
  fullRangeOverMidrangePercent: null,
  halfRangeOverMidrangePercent: null,
  halfRangeOverMeanPercent: null,
  radialVariationPercent: null,
  minimum: null,
  maximum: null,
};

function finite(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}

function percent(part: number, whole: number): number | null {
  return whole > 0 ? finite((100 * part) / whole) : null;
}

/**
 * Works out the figures of the good readings of one wafer in one pass over them, shifted by the
 * first reading so that no digits are lost to a large offset. `readings` follows `part.indices`.
 * Percent figures need a positive mean, mid-range or centre, and are null without.
 */
export function waferFigures(
  readings: Float64Array,
  part: PlanPart,
  geometry: PlanGeometry,
  isGood: Uint8Array,
  values: readonly (number | null)[],
): WaferFigures {
  const n = readings.length;
  if (n === 0) return NO_FIGURES;
  const shift = readings[0]!;
  const { weights } = part;
  let sum = 0;
  let squares = 0;
  let area = 0;
  let least = 0;
  let most = 0;
  for (let i = 0; i < n; i++) {
    const d = readings[i]! - shift;
    sum += d;
    if (weights !== null) area += weights[i]! * d;
    if (readings[i]! < readings[least]!) least = i;
    if (readings[i]! > readings[most]!) most = i;
  }
  const offset = sum / n;
  for (let i = 0; i < n; i++) {
    const d = readings[i]! - shift - offset;
    squares += d * d;
  }
  const mean = shift + offset;
  const deviation = n > 1 ? Math.sqrt(squares / (n - 1)) : null;
  const minimum = readings[least]!;
  const maximum = readings[most]!;
  const range = maximum - minimum;
  return {
    mean: finite(mean),
    areaMean: weights === null ? null : finite(shift + area),
    median: finite(medianOf(readings)),
    standardDeviation: deviation === null ? null : finite(deviation),
    relativeStandardDeviationPercent: deviation === null ? null : percent(deviation, mean),
    fullRangeOverMidrangePercent: percent(2 * range, maximum + minimum),
    halfRangeOverMidrangePercent: percent(range, maximum + minimum),
    halfRangeOverMeanPercent: percent(range / 2, mean),
    radialVariationPercent: radialVariationPercent(geometry, isGood, values),
    minimum: { value: minimum, siteIndex: part.indices[least]! },
    maximum: { value: maximum, siteIndex: part.indices[most]! },
  };
}

function medianOf(readings: Float64Array): number {
  const sorted = readings.slice().sort();
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}

function radialVariationPercent(
  geometry: PlanGeometry,
  isGood: Uint8Array,
  values: readonly (number | null)[],
): number | null {
  const average = (sites: readonly number[]): number | null => {
    let sum = 0;
    let count = 0;
    for (const i of sites) {
      if (isGood[i] === 1) {
        sum += values[i]!;
        count++;
      }
    }
    return count === 0 ? null : sum / count;
  };
  const centre = average(geometry.centreSites);
  const outer = average(geometry.outerSites);
  return centre === null || outer === null ? null : percent(outer - centre, centre);
}
