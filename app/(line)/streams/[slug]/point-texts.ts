import type { StreamPointTexts } from '@/app/_charts/stream-chart-point';
import type { ChartedFigures } from '@/lib/excursions/types';
import { type LevelAgainstExpected, levelAgainstExpected } from '@/lib/excursions/level-against-expected';
import type { PointExpected } from '@/lib/excursions/point-expected';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import {
  formatDensityPerCm3,
  formatNumber,
  formatPercent,
  formatSignedPercent,
  formatWithUncertainty,
  undefinedMark,
} from '@/lib/format';
import { dopantScalePercent } from '@/lib/physics/dopant-scale-percent';
import type { Stream } from '@/lib/streams/types';
import type { ChartUnit } from './chart-unit';

/** What is said of a point at the cursor: its figures with unit and fitting digits, and remarks. */
export function pointTexts(args: {
  shown: ChartedFigures;
  wafers: readonly SpanWafer[];
  expected: PointExpected | null;
  unit: ChartUnit;
  stream: Pick<Stream, 'chartedValue' | 'repeatabilityPercent'>;
  /** The point before it, where there is one with a level. */
  before: PointAgainst | null;
}): Omit<StreamPointTexts, 'at'> {
  const { shown, wafers, expected, unit, stream } = args;
  const { chartedValue } = stream;
  const isRelative = chartedValue === 'relative';
  const inUnit = (value: number | null, digits: number) =>
    value === null ? null : `${formatNumber(value * unit.factor, digits)}\u00a0${unit.unit}`;
  const against = levelAgainstExpected(shown.level, expected, chartedValue);
  return {
    level: isRelative ? formatSignedPercent(shown.level, 2) : (inUnit(shown.level, 4) ?? undefinedMark),
    expected: expected === null ? null : expectedText(expected, unit, isRelative),
    difference: against && differenceText(against),
    dopant: against?.dopant ? signedText(against.dopant) : null,
    density: against?.dopant && isOnePlace(wafers) ? formatDensityPerCm3(against.dopant.densityPerCm3) : null,
    onBefore: onBeforeText({ against, wafers }, args.before, expected, stream.repeatabilityPercent),
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

/** Wafers from different places along a crystal have no one density. */
const isOnePlace = (wafers: readonly SpanWafer[]) =>
  new Set(wafers.map((wafer) => wafer.ingotFraction)).size <= 1;

/** A point as the next is told from it. */
export interface PointAgainst {
  against: LevelAgainstExpected | null;
  wafers: readonly SpanWafer[];
}

/** "−2.0 ± 1.7 %": the difference in the reading, with the standard uncertainty of what is expected. */
function differenceText({ differencePercent, uncertaintyPercent }: LevelAgainstExpected): string {
  return uncertaintyPercent === null
    ? formatSignedPercent(differencePercent)
    : signedText({ percent: differencePercent, uncertaintyPercent });
}

/**
 * A point against the one before it, in percent of dopant. Each is held against what was expected of it, so a change of
 * the target in between is no difference; of the uncertainty only the repeatability of the gauge is not common to both.
 */
function onBeforeText(
  { against, wafers }: PointAgainst,
  before: PointAgainst | null,
  expected: PointExpected | null,
  repeatabilityPercent: number,
): string | null {
  if (against === null || !before?.against || expected?.model == null) return null;
  const ratio = (100 + against.differencePercent) / (100 + before.against.differencePercent);
  const { sensitivity } = expected.model;
  const readings = (of: readonly SpanWafer[]) =>
    Math.max(
      1,
      of.reduce((sum, wafer) => sum + wafer.sites - wafer.badSites, 0),
    );
  const ownPercent = repeatabilityPercent * Math.sqrt(1 / readings(wafers) + 1 / readings(before.wafers));
  return signedText({
    percent: dopantScalePercent(ratio, sensitivity),
    uncertaintyPercent: Math.abs(ownPercent / sensitivity),
  });
}

/** "+2.1 ± 1.7 %": cut where the uncertainty stops meaning anything, its sign always said. */
function signedText({
  percent,
  uncertaintyPercent,
}: {
  percent: number;
  uncertaintyPercent: number;
}): string {
  const text = formatWithUncertainty(percent, uncertaintyPercent, '%');
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
