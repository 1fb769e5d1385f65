import type { ExpectedSpan } from '@/app/_charts/stream-chart-point';
import type { ChartRow } from './chart-points';
import type { PointExpected } from './point-expected';

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
  const share = expected.uncertaintyPercent / 100;
  const [below, above] = [
    expected.model?.toleranceLowerRatio ?? null,
    expected.model?.toleranceUpperRatio ?? null,
  ];
  if (options.isRelative) {
    const percent = (ratio: number | null) => ratio && 100 * Math.log(ratio);
    return {
      value: 0,
      lower: 100 * Math.log1p(-Math.min(share, 0.99)),
      upper: 100 * Math.log1p(share),
      toleranceLower: percent(below),
      toleranceUpper: percent(above),
    };
  }
  if (expected.value === null) return null;
  const value = expected.value * options.factor;
  return {
    value,
    lower: value * (1 - share),
    upper: value * (1 + share),
    toleranceLower: below && value * below,
    toleranceUpper: above && value * above,
  };
}
