import type { ChartName } from '@/lib/control/completions-at';
import { chartDomain } from './chart-domain';
import { chartValue } from './chart-value';
import { type LimitSegment, limitSegments } from './limit-segments';
import type { ExpectedSpan, LimitSpan, StreamChartPoint } from './stream-chart-point';
import { withoutStrays } from './without-strays';

/** What one of a stream's charts draws besides its points. */
export interface PanelPlan {
  chart: ChartName;
  title: string;
  unit: string;
  height: number;
  domain: [number, number];
  segments: LimitSegment[];
  /** Only the level is expected by physics. */
  expected: readonly ExpectedSpan[];
}

const titles: Record<ChartName, { title: string; height: number }> = {
  level: { title: 'Level', height: 236 },
  'moving-range': { title: 'Moving range', height: 96 },
  within: { title: 'Within wafer', height: 104 },
  between: { title: 'Between wafers', height: 96 },
};

/**
 * The charts of a stream from top to bottom: level, moving range, within wafer, and between wafers where any point
 * has that figure. Each axis holds its limits and all points but strays; the level's also the expected band and the
 * tolerance, unless that would squeeze the points.
 */
export function streamPanels(args: {
  points: readonly StreamChartPoint[];
  limits: readonly LimitSpan[];
  expected: readonly ExpectedSpan[];
  view: { from: number; to: number };
  units: Record<ChartName, string>;
}): PanelPlan[] {
  const { points, view } = args;
  const hasBetween = points.some((point) => point.between !== null);
  const charts: ChartName[] = [
    'level',
    'moving-range',
    'within',
    ...(hasBetween ? (['between'] as const) : []),
  ];
  const expected = args.expected.filter((span) => span.toIndex >= view.from && span.fromIndex <= view.to);
  return charts.map((chart) => {
    const segments = limitSegments(args.limits, chart, view);
    const values = points.map((point) => chartValue(point, chart)).filter((value) => value !== null);
    const lines = segments.map((piece) => piece.y);
    const core = [...withoutStrays(values, lines), ...lines];
    const isLevel = chart === 'level';
    const seen = isLevel ? expected : [];
    const wishes = [
      seen.flatMap((span) => [span.lower, span.upper]),
      segments.flatMap((piece) => piece.interval ?? []),
      seen.flatMap((span) => [span.toleranceLower, span.toleranceUpper]).filter((edge) => edge !== null),
    ].filter((wish) => wish.length > 0);
    return {
      chart,
      ...titles[chart],
      unit: args.units[chart],
      domain: chartDomain(core, wishes, isLevel ? {} : { from: 0 }),
      segments,
      expected: seen,
    };
  });
}
