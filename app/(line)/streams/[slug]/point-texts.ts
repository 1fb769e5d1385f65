import type { StreamPointTexts } from '@/app/_charts/stream-chart-point';
import type { ChartedFigures } from '@/lib/excursions/types';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import {
  formatNumber,
  formatPercent,
  formatSignedPercent,
  formatWithUncertainty,
  undefinedMark,
} from '@/lib/format';
import { dopantPercent } from '@/lib/physics/dopant-percent';
import type { Stream } from '@/lib/streams/types';
import type { ChartUnit } from './chart-unit';
import type { PointExpected } from './point-expected';

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
  const ratio = ratioOf(shown.level, expected, isRelative);
  return {
    level: isRelative ? formatSignedPercent(shown.level, 2) : (inUnit(shown.level, 4) ?? undefinedMark),
    expected: expected === null ? null : expectedText(expected, unit, isRelative),
    difference: ratio === null ? null : formatSignedPercent(100 * (ratio - 1)),
    dopant: ratio === null || expected === null ? null : dopantText(ratio, expected),
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

/** Measured over expected. */
export function ratioOf(
  level: number | null,
  expected: PointExpected | null,
  isRelative: boolean,
): number | null {
  if (level === null) return null;
  if (isRelative) return Math.exp(level / 100);
  return expected?.value == null ? null : level / expected.value;
}

/** "+2.1 ± 1.7 %": the difference as percent dopant, with the standard uncertainty of what is expected. */
export function dopantText(ratio: number, { model, uncertaintyPercent }: PointExpected): string | null {
  const percent = model === null ? null : dopantPercent(ratio, model.sensitivity);
  if (model === null || percent === null) return null;
  const text = formatWithUncertainty(percent, Math.abs(uncertaintyPercent / model.sensitivity), '%');
  return percent > 0 ? `+${text}` : text;
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
