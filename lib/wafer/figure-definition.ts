import type { WaferFigures } from './wafer-figures';

/** What one figure of a wafer means, in words fit to stand beside it. */
export interface FigureDefinition {
  label: string;
  definition: string;
  /** Whether it carries the unit of the readings or is a percentage. */
  unit: 'reading' | 'percent';
  /** Where the definition comes from. */
  source: string;
}

const PRACTICE = 'common practice, no source';
const RANGE_CAUTION = 'Grows with the number of sites: never compare it across site plans.';

const DEFINITIONS: Record<keyof WaferFigures, FigureDefinition> = {
  mean: {
    label: 'mean of the sites',
    definition: 'Sum of the good readings over their number. The outer ring counts more than its area.',
    unit: 'reading',
    source: 'arithmetic mean',
  },
  areaMean: {
    label: 'area mean',
    definition:
      'Mean of the good readings, each weighted by its Voronoi cell (all places nearer to it than to another good site) clipped to the quality area, a disc of half the diameter less the edge exclusion.',
    unit: 'reading',
    source: 'Voronoi 1908; undefined without a diameter',
  },
  median: {
    label: 'median',
    definition:
      'The middle good reading in order of size; the mean of the two middle ones of an even number.',
    unit: 'reading',
    source: 'order statistics',
  },
  standardDeviation: {
    label: 's within the wafer',
    definition:
      'Root of the summed squares of the good readings about their mean, over their number less one.',
    unit: 'reading',
    source: 'sample standard deviation, n - 1',
  },
  relativeStandardDeviationPercent: {
    label: 'relative s',
    definition: '100 · s / mean, one standard deviation, s with n - 1.',
    unit: 'percent',
    source: PRACTICE,
  },
  fullRangeOverMidrangePercent: {
    label: 'full range over mid-range',
    definition: `200 · (maximum - minimum) / (maximum + minimum). Twice the half range. ${RANGE_CAUTION}`,
    unit: 'percent',
    source: PRACTICE,
  },
  halfRangeOverMidrangePercent: {
    label: 'half range over mid-range',
    definition: `100 · (maximum - minimum) / (maximum + minimum). ${RANGE_CAUTION}`,
    unit: 'percent',
    source: PRACTICE,
  },
  halfRangeOverMeanPercent: {
    label: 'half range over mean',
    definition: `100 · (maximum - minimum) / (2 · mean of the sites). ${RANGE_CAUTION}`,
    unit: 'percent',
    source: PRACTICE,
  },
  radialVariationPercent: {
    label: 'outer ring against centre',
    definition:
      '100 · (mean of the outermost ring - centre) / centre; a site belongs to ring or centre within 2 % of the radius. Undefined where the plan has no centre or its reading is bad.',
    unit: 'percent',
    source: PRACTICE,
  },
  minimum: {
    label: 'lowest reading',
    definition: 'The lowest good reading, and where it is.',
    unit: 'reading',
    source: 'order statistics',
  },
  maximum: {
    label: 'highest reading',
    definition: 'The highest good reading, and where it is.',
    unit: 'reading',
    source: 'order statistics',
  },
};

/** The order in which the figures of a wafer are listed: where it lies, how even it is, its extremes. */
export const FIGURE_ORDER = [
  'areaMean',
  'mean',
  'median',
  'standardDeviation',
  'relativeStandardDeviationPercent',
  'fullRangeOverMidrangePercent',
  'halfRangeOverMidrangePercent',
  'halfRangeOverMeanPercent',
  'radialVariationPercent',
  'minimum',
  'maximum',
] as const satisfies readonly (keyof WaferFigures)[];

/**
 * The definition of a figure, for whoever reads it: several non-uniformities share a name in the
 * trade and differ by a factor of two, so none is shown without one.
 *
 * @example figureDefinition('relativeStandardDeviationPercent').label // 'relative s'
 */
export function figureDefinition(name: keyof WaferFigures): FigureDefinition {
  return DEFINITIONS[name];
}
