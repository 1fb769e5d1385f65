import { expectedOrNull } from '@/lib/physics/expected-or-null';
import type { Expected } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { ExpectedWafer } from '@/lib/physics/target';
import { inForce } from '@/lib/streams/in-force';
import { screeningAt } from '@/lib/streams/screening-at';
import type { Specification, Stream, StreamSettings, TargetRevision } from '@/lib/streams/types';
import { measureWafer, type Screen, type WaferMeasure } from '@/lib/wafer/measure-wafer';
import type { PlanGeometry } from '@/lib/wafer/plan-geometry';
import { sharedGeometry } from './shared-geometry';
import type { MeasurementFacts } from './types';
import { valuesAt23C } from './values-at-23c';

/** A stream ready to measure wafers by: its settings, and what can be worked out once for all of them. */
export interface MeasuringStream {
  settings: StreamSettings;
  geometry: PlanGeometry;
  /** Expected values of targets that are the same for every wafer, by the target revision's id. */
  expectedOf: Map<string, Expected | null>;
}

/** A wafer measured: its figures, what physics expects of it, and what is charted and held against specification. */
export interface MeasuredWafer {
  measure: WaferMeasure;
  screening: Screen;
  target: TargetRevision | null;
  expected: Expected | null;
  /** The charted value and the relative s of the wafer in percent; null where it is not judged. */
  level: number | null;
  within: number | null;
  notJudgedReason: string | null;
  /** `rule:side` for each way out of specification, which is looked at even where nothing is expected of the wafer. */
  specification: string[];
}

type Facts = Pick<
  MeasurementFacts,
  'processedAt' | 'ingotFraction' | 'thicknessUm' | 'temperatureC' | 'correctionsApplied'
>;

export function measuringStream(settings: StreamSettings): MeasuringStream {
  return { settings, geometry: sharedGeometry(settings.stream.plan), expectedOf: new Map() };
}

/**
 * From readings to everything the program says of one wafer: screened, measured, held against what physics expects
 * and what is specified. `overrides` is a person's word on sites.
 */
export function measuredWafer(
  by: MeasuringStream,
  facts: Facts,
  readings: readonly (number | null)[],
  options: { screen?: Screen; overrides?: ReadonlyMap<number, 'in' | 'out'>; shape?: boolean } = {},
): MeasuredWafer {
  const { stream, targets, specifications } = by.settings;
  const target = inForce(targets, facts.processedAt);
  const values = valuesAt23C(readings, facts, target?.target ?? null, expectedWafer(stream, facts));
  const screening = options.screen ?? screeningAt(by.settings, facts.processedAt);
  const measure = measureWafer(values, by.geometry, {
    screen: screening,
    shape: options.shape ?? false,
    ...(options.overrides === undefined ? {} : { overrides: options.overrides }),
  });
  const expected = expectedOf(by, target, facts);
  const statistic = measure.figures[stream.controlStatistic];
  const unfit =
    measure.notJudgeableReason ??
    (statistic === null || statistic <= 0 ? 'the wafer has no value to chart' : null);
  const notJudgedReason =
    unfit ??
    (stream.chartedValue === 'relative' && expected === null ? missingWords(target, stream, facts) : null);
  const judged = notJudgedReason === null && statistic !== null;
  const specification = inForce(specifications, facts.processedAt)?.specification ?? null;
  return {
    measure,
    screening,
    target,
    expected,
    level: !judged ? null : stream.chartedValue === 'statistic' ? statistic : relative(statistic, expected),
    within: judged ? measure.figures.relativeStandardDeviationPercent : null,
    notJudgedReason,
    specification:
      unfit === null && statistic !== null && specification !== null
        ? faults(specification, statistic, measure)
        : [],
  };
}

/** What physics expects of one wafer of a stream; null where something it needs is missing or out of range. */
export function expectedOf(
  by: MeasuringStream,
  target: TargetRevision | null,
  facts: Facts,
): Expected | null {
  if (target === null) return null;
  const wafer = expectedWafer(by.settings.stream, facts);
  const isSame = !target.target.alongCrystal && (wafer.layerThicknessUm ?? null) === null;
  const known = isSame ? by.expectedOf.get(target.id) : undefined;
  if (known !== undefined) return known;
  const found = expectedOrNull(target.target, wafer);
  if (isSame) by.expectedOf.set(target.id, found);
  return found;
}

/** What a wafer brings to its expected value: a layer's own thickness counts where the layer is what is measured. */
export function expectedWafer(
  stream: Stream,
  facts: { ingotFraction: number | null; thicknessUm: number | null },
): ExpectedWafer {
  const isLayer = stream.kind === 'epi' && stream.quantity === 'sheet_resistance';
  return { ingotFraction: facts.ingotFraction, layerThicknessUm: isLayer ? facts.thicknessUm : null };
}

function relative(statistic: number, expected: Expected | null): number | null {
  return expected === null ? null : 100 * Math.log(statistic / expected.value);
}

/** Why nothing is expected of a wafer. */
export function missingWords(target: TargetRevision | null, stream: Stream, facts: Facts): string {
  if (target === null) return 'the stream has no target, so nothing is expected of the wafer';
  const missing = missingForExpected(target.target, expectedWafer(stream, facts));
  if (missing === 'ingotFraction')
    return 'its place along the crystal is not given, so nothing is expected of it';
  if (missing === 'layerThicknessUm')
    return 'the thickness of its layer is not given, so nothing is expected of it';
  return 'what physics expects of it lies outside the conversion';
}

function faults(specification: Specification, statistic: number, measure: WaferMeasure): string[] {
  const { meanLower, meanUpper, siteLower, siteUpper, nonuniformityMetric, nonuniformityUpper } =
    specification;
  const { minimum, maximum } = measure.figures;
  const evenness = nonuniformityMetric === null ? null : measure.figures[nonuniformityMetric];
  const found: string[] = [];
  if (meanLower !== null && statistic < meanLower) found.push('wafer-mean:below');
  if (meanUpper !== null && statistic > meanUpper) found.push('wafer-mean:above');
  if (siteLower !== null && minimum !== null && minimum.value < siteLower) found.push('site:below');
  if (siteUpper !== null && maximum !== null && maximum.value > siteUpper) found.push('site:above');
  if (nonuniformityUpper !== null && evenness !== null && Math.abs(evenness) > nonuniformityUpper) {
    found.push('nonuniformity:above');
  }
  return found;
}
