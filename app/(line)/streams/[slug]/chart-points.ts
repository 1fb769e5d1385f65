import type { StreamChartPoint } from '@/app/_charts/stream-chart-point';
import { levelAgainstExpected } from '@/lib/excursions/level-against-expected';
import { type ModelOf, type PointExpected, pointExpected } from '@/lib/excursions/point-expected';
import { subgroupLabel } from '@/lib/excursions/subgroup-label';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import { formatDateTime, shortDay } from '@/lib/format';
import type { Stream } from '@/lib/streams/types';
import type { ChartUnit } from './chart-unit';
import type { DrawnPoint } from './drawn-points';
import { lateOnes } from './late-ones';
import { type PointAgainst, pointTexts } from './point-texts';

/** What the rows of a stream's charts are made of. */
export interface ChartSource {
  stream: Pick<Stream, 'subgroup' | 'chartedValue' | 'repeatabilityPercent'>;
  points: readonly DrawnPoint[];
  wafersOf: ReadonlyMap<string, readonly SpanWafer[]>;
  modelOf: ModelOf;
  unit: ChartUnit;
  timeZone: string;
  /** Only some subgroups are shown: limits, rules and moving ranges of the whole stream say nothing about these. */
  isFiltered: boolean;
}

/** A drawn point, and what was expected of it. */
export type ChartRow = StreamChartPoint & { expected: PointExpected | null };

/**
 * The rows of a stream's charts. In a filtered view the moving range runs from one shown subgroup to the next, and no
 * rule is marked: the rules looked at neighbours that are not shown. Out of specification stays: it is a wafer's own.
 */
export function chartRows(source: ChartSource): ChartRow[] {
  const { stream, unit, isFiltered } = source;
  const late = lateOnes(source.points, source.wafersOf);
  const scaled = (value: number | null) => value && value * unit.factor;
  let before: number | null = null;
  let pointBefore: PointAgainst | null = null;
  return source.points.map((point) => {
    const wafers = source.wafersOf.get(point.id) ?? [];
    const expected = pointExpected(wafers, source.modelOf);
    const ownRange = before === null || point.level === null ? null : Math.abs(point.level - before);
    if (point.level !== null) before = point.level;
    const shown = { ...point, movingRange: isFiltered ? ownRange : point.movingRange };
    const texts = pointTexts({ shown, wafers, expected, unit, stream, before: pointBefore });
    if (point.level !== null) {
      pointBefore = { against: levelAgainstExpected(point.level, expected, stream.chartedValue), wafers };
    }
    const at = new Date(point.at);
    const minute = formatDateTime(at, source.timeZone);
    return {
      id: point.id,
      index: point.index,
      label: subgroupLabel(stream.subgroup, point.key),
      at: at.toISOString(),
      day: shortDay(minute),
      level: scaled(shown.level),
      movingRange: scaled(shown.movingRange),
      within: shown.within,
      between: scaled(shown.between),
      completions: isFiltered ? [] : point.completions,
      outOfSpecification: point.outOfSpecification,
      open: point.state === 'open',
      judged: point.state === 'judged',
      hollow: late.has(point.id) || wafers.some((wafer) => wafer.isMeasuredAgain),
      href: wafers[0] === undefined ? '' : `/wafers/${wafers[0].id}`,
      texts: { at: minute, ...texts },
      expected,
    };
  });
}
