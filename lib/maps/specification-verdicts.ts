import type { Specification, Stream } from '@/lib/streams/types';
import { figureDefinition } from '@/lib/wafer/figure-definition';
import type { WaferFigures } from '@/lib/wafer/measure-wafer';

/** One thing that is specified, what this wafer has, and whether that is inside. */
export interface SpecificationVerdict {
  name: string;
  /** In the unit of the readings, or in percent. */
  kind: 'reading' | 'percent';
  value: number | null;
  lower: number | null;
  upper: number | null;
  /** As recorded when the wafer was judged. */
  verdict: 'inside' | 'below' | 'above' | 'not judged';
}

/** A specification point by point. `faults` are the ways out of it on record, as `rule:side`; null where the wafer is not judged. */
export function specificationVerdicts(
  specification: Specification,
  figures: WaferFigures,
  statistic: Stream['controlStatistic'],
  faults: readonly string[] | null,
): SpecificationVerdict[] {
  const { meanLower, meanUpper, siteLower, siteUpper, nonuniformityMetric, nonuniformityUpper } =
    specification;
  const verdict = (rule: string): SpecificationVerdict['verdict'] => {
    if (faults === null) return 'not judged';
    if (faults.includes(`${rule}:above`)) return 'above';
    return faults.includes(`${rule}:below`) ? 'below' : 'inside';
  };
  const site = verdict('site');
  const found: SpecificationVerdict[] = [
    {
      name: figureDefinition(statistic).label,
      kind: 'reading',
      value: figures[statistic],
      lower: meanLower,
      upper: meanUpper,
      verdict: verdict('wafer-mean'),
    },
    {
      name: 'lowest reading',
      kind: 'reading',
      value: figures.minimum?.value ?? null,
      lower: siteLower,
      upper: null,
      verdict: faults?.includes('site:below') ? 'below' : site === 'not judged' ? site : 'inside',
    },
    {
      name: 'highest reading',
      kind: 'reading',
      value: figures.maximum?.value ?? null,
      lower: null,
      upper: siteUpper,
      verdict: faults?.includes('site:above') ? 'above' : site === 'not judged' ? site : 'inside',
    },
  ];
  if (nonuniformityMetric !== null) {
    found.push({
      name: figureDefinition(nonuniformityMetric).label,
      kind: 'percent',
      value: figures[nonuniformityMetric],
      lower: null,
      upper: nonuniformityUpper,
      verdict: verdict('nonuniformity'),
    });
  }
  return found.filter(({ lower, upper }) => lower !== null || upper !== null);
}
