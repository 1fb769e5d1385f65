import type { SpecificationSpan } from '@/app/_charts/case-plot';
import type { ChartName } from '@/lib/control/completions-at';
import type { CaseSpecification, ExcursionCase } from '@/lib/excursions/types';
import { inForce } from '@/lib/streams/in-force';

/**
 * What was specified of the charted figure along a stretch: one span for each run of subgroups processed under one
 * revision, by the rule that wafers are held by (`inForce`). A level is specified where it is the statistic itself, the
 * spread within where its relative s is the evenness agreed on.
 */
export function specificationSpans(
  { points, specifications, stream }: Pick<ExcursionCase, 'points' | 'specifications' | 'stream'>,
  chart: ChartName,
): SpecificationSpan[] {
  const spans: SpecificationSpan[] = [];
  let open: { revision: CaseSpecification | null; span: SpecificationSpan | null } | null = null;
  points.forEach(({ at }, index) => {
    const revision = inForce(specifications, at);
    if (open === null || open.revision !== revision) {
      const edges = revision === null ? null : edgesOf(revision, chart, stream.chartedValue);
      const span = edges && { fromIndex: index, toIndex: index, ...edges };
      if (span !== null) spans.push(span);
      open = { revision, span };
    }
    if (open.span !== null) open.span.toIndex = index;
  });
  return spans;
}

function edgesOf(
  revision: CaseSpecification,
  chart: ChartName,
  chartedValue: ExcursionCase['stream']['chartedValue'],
): { lower: number | null; upper: number | null } | null {
  const { meanLower, meanUpper, nonuniformityMetric, nonuniformityUpper } = revision;
  if (chart === 'level' && chartedValue === 'statistic') return { lower: meanLower, upper: meanUpper };
  if (chart !== 'within' || nonuniformityMetric !== 'relativeStandardDeviationPercent') return null;
  return { lower: null, upper: nonuniformityUpper };
}
