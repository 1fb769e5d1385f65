import type { CsvCell } from '@/lib/csv-response';
import { levelAgainstExpected } from '@/lib/excursions/level-against-expected';
import { modelsOf, pointExpected } from '@/lib/excursions/point-expected';
import type { SpanPoint } from '@/lib/excursions/span-points';
import { subgroupLabel } from '@/lib/excursions/subgroup-label';
import type { CsvSpan } from './csv-span';

/**
 * The subgroups of a stretch as rows of a file, in the quantity's own unit. Of a filtered stretch without limits, rules
 * and moving ranges: these were made for the whole stream.
 */
export function pointsCsv(span: CsvSpan): { columns: string[]; rows: CsvCell[][] } {
  const { stream, targets } = span.settings;
  const isRelative = stream.chartedValue === 'relative';
  const unit = isRelative ? 'percent' : span.unit;
  const modelOf = modelsOf(targets);
  const limitsOf = new Map(span.standing.limits.map((limits) => [limits.id, limits]));
  const rows = span.points.map((point): CsvCell[] => {
    const wafers = span.wafersOf.get(point.id) ?? [];
    const expected = pointExpected(wafers, modelOf);
    const against = levelAgainstExpected(point.level, expected, stream.chartedValue);
    const gauges = [...new Set(wafers.map((wafer) => wafer.gauge).filter((gauge) => gauge !== null))];
    return [
      subgroupLabel(stream.subgroup, point.key),
      new Date(point.at),
      point.state,
      wafers.map((wafer) => wafer.wafer).join(' '),
      gauges.join(' '),
      point.level,
      span.isFiltered ? null : point.movingRange,
      point.within,
      point.between,
      ...(span.isFiltered ? NO_LIMITS : limitCells(point, limitsOf)),
      point.outOfSpecification,
      isRelative ? null : (expected?.value ?? null),
      expected?.uncertaintyPercent ?? null,
      against?.differencePercent ?? null,
      against?.dopant?.percent ?? null,
    ];
  });
  const columns = [
    ...['subgroup', 'processed_at', 'state', 'wafers', 'gauges', `level_${unit}`, `moving_range_${unit}`],
    ...['within_percent', `between_${unit}`, 'limits_revision', `lower_${unit}`, `centre_${unit}`],
    ...[`upper_${unit}`, `moving_range_upper_${unit}`, 'within_lower_percent', 'within_upper_percent'],
    ...['rules', 'out_of_specification', `expected_${span.unit}`, 'expected_uncertainty_percent'],
    ...['against_expected_percent', 'against_expected_dopant_percent'],
  ];
  return { columns, rows };
}

const NO_LIMITS: readonly null[] = [null, null, null, null, null, null, null, null];

function limitCells(
  point: SpanPoint,
  limitsOf: ReadonlyMap<string, CsvSpan['standing']['limits'][number]>,
): CsvCell[] {
  const found = point.limitsId === null ? undefined : limitsOf.get(point.limitsId);
  const limits = found?.limits;
  return [
    found?.revision ?? null,
    limits?.level.lower ?? null,
    limits?.level.centre ?? null,
    limits?.level.upper ?? null,
    limits?.movingRange.upper ?? null,
    limits?.within?.lower ?? null,
    limits?.within?.upper ?? null,
    point.completions.join(' '),
  ];
}
