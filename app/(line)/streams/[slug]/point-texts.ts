import type { StreamPointTexts } from '@/app/_charts/stream-chart-point';
import type { ChartedFigures } from '@/lib/excursions/types';
import { type LevelAgainstExpected, levelAgainstExpected } from '@/lib/excursions/level-against-expected';
import type { PointExpected } from '@/lib/excursions/point-expected';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import {
  formatNumber,
  formatPercent,
  formatSignedPercent,
  formatWithUncertainty,
  undefinedMark,
} from '@/lib/format';
import type { Stream } from '@/lib/streams/types';
import type { ChartUnit } from './chart-unit';

/** What is said of a point at the cursor: its figures with unit and fitting digits, and remarks. */
export function pointTexts(args: {
  shown: ChartedFigures;
  wafers: readonly SpanWafer[];
  expected: PointExpected | null;
  unit: ChartUnit;
  chartedValue: Stream['chartedValue'];
}): Omit<StreamPointTexts, 'at'> {
  const { shown, wafers, expected, unit, chartedValue } = args;
  const isRelative = chartedValue === 'relative';
  const inUnit = (value: number | null, digits: number) =>
    value === null ? null : `${formatNumber(value * unit.factor, digits)}\u00a0${unit.unit}`;
  const against = levelAgainstExpected(shown.level, expected, chartedValue);
  return {
    level: isRelative ? formatSignedPercent(shown.level, 2) : (inUnit(shown.level, 4) ?? undefinedMark),
    expected: expected === null ? null : expectedText(expected, unit, isRelative),
    difference: against && formatSignedPercent(against.differencePercent),
    dopant: dopantText(against?.dopant ?? null),
    movingRange: isRelative
      ? shown.movingRange === null
        ? null
        : formatPercent(shown.movingRange)
      : inUnit(shown.movingRange, 2),
    within: shown.within === null ? null : formatPercent(shown.within),
    between: isRelative
      ? shown.between === null
        ? null
        : formatPercent(shown.between)
      : inUnit(shown.between, 2),
    notes: notesOf(wafers),
  };
}

/** "+2.1 ± 1.7 %": the difference as percent dopant, with the standard uncertainty of what is expected. */
function dopantText(dopant: LevelAgainstExpected['dopant']): string | null {
  if (dopant === null) return null;
  const text = formatWithUncertainty(dopant.percent, dopant.uncertaintyPercent, '%');
  return dopant.percent > 0 ? `+${text}` : text;
}

function expectedText({ value, uncertaintyPercent }: PointExpected, unit: ChartUnit, isRelative: boolean) {
  if (isRelative) return `0 ± ${formatNumber(uncertaintyPercent, 2)}\u00a0%`;
  if (value === null) return 'differs by wafer';
  const inUnit = value * unit.factor;
  return formatWithUncertainty(inUnit, (inUnit * uncertaintyPercent) / 100, unit.unit);
}

function notesOf(wafers: readonly SpanWafer[]): string[] {
  const gauges = [...new Set(wafers.map((wafer) => wafer.gauge).filter((gauge) => gauge !== null))];
  const sum = (figure: 'badSites' | 'sites') => wafers.reduce((total, wafer) => total + wafer[figure], 0);
  const sites = `${sum('badSites')} of ${sum('sites')} sites bad`;
  const names = wafers.length > 1 ? [`Wafers ${wafers.map((wafer) => wafer.wafer).join(', ')}`] : [];
  const notJudged = wafers.filter((wafer) => wafer.notJudgedReason !== null);
  return [
    [...gauges, sites].join(' · '),
    ...names,
    ...notJudged.map((wafer) => `Wafer ${wafer.wafer} is not judged: ${wafer.notJudgedReason}`),
  ];
}
