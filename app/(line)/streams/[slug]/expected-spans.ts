import type { ExpectedSpan } from '@/app/_charts/stream-chart-point';
import { expectedBand } from '@/lib/excursions/level-against-expected';
import type { PointExpected } from '@/lib/excursions/point-expected';
import type { ChartRow } from './chart-points';

/**
 * What physics expected along a stretch: one span for each run of points measured against the same, value ± standard
 * uncertainty (k = 1), and the target's tolerance apart. On a relative chart expected is 0 %. Points that are not
 * drawn belong to the span before them.
 */
export function expectedSpans(
  rows: readonly Pick<ChartRow, 'index' | 'level' | 'expected'>[],
  options: { isRelative: boolean; factor: number },
): ExpectedSpan[] {
  const spans: ExpectedSpan[] = [];
  let open: { name: string | null; span: ExpectedSpan | null } = { name: null, span: null };
  for (const { index, level, expected } of rows) {
    if (level === null) continue;
    const name = expected === null ? null : `${expected.targetId} ${options.isRelative || expected.value}`;
    if (name === open.name) {
      if (open.span !== null) open.span.toIndex = index;
      continue;
    }
    if (open.span !== null) open.span.toIndex = index - 1;
    const band = expected === null ? null : bandOf(expected, options);
    const span = band && { fromIndex: index, toIndex: index, ...band };
    if (span !== null) spans.push(span);
    open = { name, span };
  }
  return spans;
}

type Band = Omit<ExpectedSpan, 'fromIndex' | 'toIndex'>;

function bandOf(expected: PointExpected, options: { isRelative: boolean; factor: number }): Band | null {
  const { isRelative, factor } = options;
  const band = expectedBand(expected, isRelative ? 'relative' : 'statistic');
  if (band === null) return null;
  const edge = (ratio: number | null | undefined) =>
    ratio == null ? null : isRelative ? 100 * Math.log(ratio) : band.value * factor * ratio;
  return {
    value: band.value * factor,
    lower: band.lower * factor,
    upper: band.upper * factor,
    toleranceLower: edge(expected.model?.toleranceLowerRatio),
    toleranceUpper: edge(expected.model?.toleranceUpperRatio),
  };
}
