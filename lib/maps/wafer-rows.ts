import { arrayLiteral, type Column } from '@/lib/database/columnar';
import type { MeasuredWafer } from './measured-wafer';
import { sentContent } from './sent-content';
import type { Measurement, MeasurementFacts } from './types';
import { correctedBy } from './values-at-23c';

/** One measurement with everything that is written of it. */
export interface WaferRow {
  id: string;
  subgroupId: string;
  batchId: string;
  measurement: Measurement;
  history: boolean;
  recordedAt: Date;
  recordedBy: string;
  measured: MeasuredWafer;
}

/** The run, else the lot, else nothing: the carrier that makes a wafer's name unique. */
export function runOrLot(facts: MeasurementFacts): string {
  return facts.run ?? facts.lot ?? '';
}

/** The subgroup a wafer belongs to, by the stream's kind of subgroup. */
export function subgroupKey(kind: 'wafer' | 'run' | 'lot' | 'ingot', facts: MeasurementFacts): string {
  if (kind === 'wafer') {
    const part = (name: string) => name.replaceAll('/', '//');
    return `${part(runOrLot(facts))}/${part(facts.wafer)}/${facts.measuredAt.toISOString()}`;
  }
  return (kind === 'run' ? facts.run : facts.lot) ?? '';
}

/** What measuring a wafer decides. */
type MeasuredRow = Pick<WaferRow, 'measured'>;

const figure = (name: keyof MeasuredWafer['measure']['figures'], column: string): Column<MeasuredRow> => ({
  name: column,
  type: 'float8',
  value: ({ measured }) => {
    const value = measured.measure.figures[name];
    return value === null || typeof value === 'number' ? value : value.value;
  },
});

const fact = (name: keyof MeasurementFacts, column: string, type: string): Column<WaferRow> => ({
  name: column,
  type,
  value: ({ measurement }) => measurement.facts[name],
});

const time = (name: 'measuredAt' | 'processedAt', column: string): Column<WaferRow> => ({
  name: column,
  type: 'timestamptz',
  value: ({ measurement }) => measurement.facts[name],
});

/** What measuring decides, written at first and again when a person takes a reading out or puts one back. */
export const MEASURED_COLUMNS: readonly Column<MeasuredRow>[] = [
  { name: 'screening', type: 'text', value: (row) => row.measured.screening },
  { name: 'not_judged_reason', type: 'text', value: (row) => row.measured.notJudgedReason },
  { name: 'bad_sites', type: 'integer', value: (row) => row.measured.measure.badSites },
  { name: 'excluded_sites', type: 'integer', value: (row) => row.measured.measure.excludedSites },
  { name: 'good_sites', type: 'integer', value: (row) => row.measured.measure.goodSites },
  { name: 'bad_site_indices', type: 'integer[]', value: (row) => arrayLiteral(badSites(row.measured)) },
  {
    name: 'bad_site_reasons',
    type: 'text[]',
    value: ({ measured }) =>
      arrayLiteral(badSites(measured).map((site) => measured.measure.status[site] ?? '')),
  },
  figure('mean', 'mean'),
  figure('areaMean', 'area_mean'),
  figure('median', 'median'),
  figure('standardDeviation', 'standard_deviation'),
  figure('relativeStandardDeviationPercent', 'relative_standard_deviation_percent'),
  figure('fullRangeOverMidrangePercent', 'full_range_over_midrange_percent'),
  figure('halfRangeOverMidrangePercent', 'half_range_over_midrange_percent'),
  figure('halfRangeOverMeanPercent', 'half_range_over_mean_percent'),
  figure('radialVariationPercent', 'radial_variation_percent'),
  figure('minimum', 'minimum'),
  {
    name: 'minimum_site',
    type: 'integer',
    value: (row) => row.measured.measure.figures.minimum?.siteIndex ?? null,
  },
  figure('maximum', 'maximum'),
  {
    name: 'maximum_site',
    type: 'integer',
    value: (row) => row.measured.measure.figures.maximum?.siteIndex ?? null,
  },
  { name: 'target_revision_id', type: 'bigint', value: (row) => row.measured.target?.id ?? null },
  { name: 'expected', type: 'float8', value: (row) => row.measured.expected?.value ?? null },
  {
    name: 'expected_uncertainty_percent',
    type: 'float8',
    value: (row) => row.measured.expected?.uncertaintyPercent ?? null,
  },
  { name: 'level', type: 'float8', value: (row) => row.measured.level },
  { name: 'specification', type: 'text[]', value: (row) => arrayLiteral(row.measured.specification) },
];

export const WAFER_COLUMNS: readonly Column<WaferRow>[] = [
  { name: 'stream_id', type: 'bigint', value: (row) => row.measurement.streamId },
  { name: 'id', type: 'bigint', value: (row) => row.id },
  { name: 'subgroup_id', type: 'bigint', value: (row) => row.subgroupId },
  { name: 'batch_id', type: 'bigint', value: (row) => row.batchId },
  fact('lot', 'lot', 'text'),
  fact('run', 'run', 'text'),
  { name: 'run_or_lot', type: 'text', value: (row) => runOrLot(row.measurement.facts) },
  fact('wafer', 'wafer', 'text'),
  fact('slot', 'slot', 'integer'),
  time('measuredAt', 'measured_at'),
  time('processedAt', 'processed_at'),
  fact('stage', 'stage', 'text'),
  fact('tool', 'tool', 'text'),
  fact('chamber', 'chamber', 'text'),
  fact('recipe', 'recipe', 'text'),
  fact('gauge', 'gauge', 'text'),
  fact('operator', 'operator', 'text'),
  fact('temperatureC', 'temperature_c', 'float8'),
  fact('thicknessUm', 'thickness_um', 'float8'),
  fact('ingotFraction', 'ingot_fraction', 'float8'),
  {
    name: 'corrections_applied',
    type: 'text',
    value: ({ measurement }) => measurement.facts.correctionsApplied.join(' ') || 'none',
  },
  {
    name: 'corrected_by',
    type: 'text',
    value: ({ measurement }) => correctedBy(measurement.facts.correctionsApplied),
  },
  fact('note', 'note', 'text'),
  { name: 'content_hash', type: 'text', value: (row) => sentContent(row.measurement).hash },
  { name: 'history', type: 'boolean', value: (row) => row.history },
  { name: 'recorded_at', type: 'timestamptz', value: (row) => row.recordedAt },
  { name: 'recorded_by', type: 'text', value: (row) => row.recordedBy },
  { name: 'sites', type: 'integer', value: (row) => row.measured.measure.sites },
  ...MEASURED_COLUMNS,
];

export const READING_COLUMNS: readonly Column<WaferRow>[] = [
  { name: 'stream_id', type: 'bigint', value: (row) => row.measurement.streamId },
  { name: 'wafer_id', type: 'bigint', value: (row) => row.id },
  { name: 'reading', type: 'float8[]', value: (row) => sentContent(row.measurement).readings },
];

function badSites({ measure }: MeasuredWafer): number[] {
  if (measure.badSites === 0) return [];
  return measure.status.flatMap((status, site) => (status === 'good' || status === 'excluded' ? [] : [site]));
}
