/** One part of the uncertainty of an expected value, in percent of the value. */
export interface UncertaintyPart {
  name: string;
  /** A bound that nothing within is likelier than the rest, or a standard deviation (JCGM 100:2008, 4.3.7 and 4.3.4). */
  kind: 'rectangular' | 'normal';
  /** The half-width of a rectangular part. */
  boundPercent: number | null;
  standardPercent: number;
  /** The same for every wafer of a stream, so that it tells no wafer from the next. */
  isCommon: boolean;
  source: string;
}

/** The uncertainty of an expected value and what it is made of. */
export interface UncertaintyBudget {
  parts: readonly UncertaintyPart[];
  /** Root of the sum of squares, k = 1. */
  standardPercent: number;
  /** k = 2. */
  expandedPercent: number;
  /** Of one wafer against another of the stream: the common parts left out. */
  betweenWafersPercent: number;
}

/** A part known as a bound: its standard uncertainty is the half-width over √3 (JCGM 100:2008, 4.3.7). */
export function boundedPart(
  name: string,
  boundPercent: number,
  isCommon: boolean,
  source: string,
): UncertaintyPart {
  const standardPercent = boundPercent / Math.sqrt(3);
  return { name, kind: 'rectangular', boundPercent, standardPercent, isCommon, source };
}

/** A part known as a standard uncertainty. */
export function normalPart(
  name: string,
  standardPercent: number,
  isCommon: boolean,
  source: string,
): UncertaintyPart {
  return { name, kind: 'normal', boundPercent: null, standardPercent, isCommon, source };
}

/**
 * Parts added up in quadrature (JCGM 100:2008, 5.1.2, parts taken as independent), expanded by k = 2, and once more
 * without the parts that are common to a stream.
 *
 * A target's tolerance is none of the parts (JCGM 106:2012). Throws RangeError for a part that is negative or no number.
 *
 * @example combinedBudget([boundedPart('conversion', 3, true, …)]).standardPercent // 1.732
 */
export function combinedBudget(parts: readonly UncertaintyPart[]): UncertaintyBudget {
  let [all, own] = [0, 0];
  for (const { name, standardPercent, isCommon } of parts) {
    if (!(standardPercent >= 0 && Number.isFinite(standardPercent))) {
      throw new RangeError(`An uncertainty is not negative; of the ${name} it is ${standardPercent}.`);
    }
    all += standardPercent ** 2;
    if (!isCommon) own += standardPercent ** 2;
  }
  const standardPercent = Math.sqrt(all);
  return {
    parts,
    standardPercent,
    expandedPercent: 2 * standardPercent,
    betweenWafersPercent: Math.sqrt(own),
  };
}
