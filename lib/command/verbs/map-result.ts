import { formatNumber, formatPercent } from '@/lib/format';
import { FIGURE_ORDER, figureDefinition } from '@/lib/wafer/figure-definition';
import type { WaferMeasure } from '@/lib/wafer/measure-wafer';
import type { PlanGeometry } from '@/lib/wafer/plan-geometry';
import type { WaferRows } from './read-map-file';

/** The measures of one wafer under the names that `map --json` prints. */
export function mapResult(rows: WaferRows, geometry: PlanGeometry, measure: WaferMeasure) {
  const { minimum, maximum, ...figures } = measure.figures;
  const place = (site: number) => ({ x_mm: rows.sites[site]!.xMm, y_mm: rows.sites[site]!.yMm });
  const reading = (site: number) => {
    const value = rows.values[site] ?? null;
    return { ...place(site), value: value !== null && Number.isFinite(value) ? value : null };
  };
  return {
    wafer: rows.wafer,
    unit: rows.unit,
    diameterMm: geometry.diameterMm,
    edgeExclusionMm: geometry.edgeExclusionMm,
    sites: measure.sites,
    badSites: measure.badSites,
    excludedSites: measure.excludedSites,
    goodSites: measure.goodSites,
    ...figures,
    minimum: minimum?.value ?? null,
    minimumAt: minimum === null ? null : place(minimum.siteIndex),
    maximum: maximum?.value ?? null,
    maximumAt: maximum === null ? null : place(maximum.siteIndex),
    bad: measure.status.flatMap((status, site) =>
      status === 'good' || status === 'excluded' ? [] : [{ ...reading(site), reason: status }],
    ),
    features: measure.features.map(({ sites, description }) => ({ sites: sites.map(reading), description })),
    shape: measure.shape,
    judgeable: measure.judgeable,
    notJudgeableReason: measure.notJudgeableReason,
  };
}

export type MapResult = ReturnType<typeof mapResult>;

/** The same for a person: a table of figures, then what is bad and what stands out. */
export function mapLines(result: MapResult): string[] {
  const name = result.wafer === null ? 'wafer' : `wafer ${result.wafer}`;
  const excluded = result.excludedSites > 0 ? `, ${result.excludedSites} in the edge exclusion` : '';
  return [
    `${name}: ${result.goodSites} of ${result.sites} sites good, ${result.badSites} bad${excluded}`,
    ...(result.notJudgeableReason === null ? [] : [`not fit to be judged: ${result.notJudgeableReason}`]),
    ...FIGURE_ORDER.map((figure) => {
      const { label, unit } = figureDefinition(figure);
      const value = result[figure];
      const text =
        unit === 'percent'
          ? formatPercent(value, 3)
          : `${formatNumber(value, 7)}${value === null ? '' : ` ${result.unit}`}`;
      return `  ${label.padEnd(28)} ${text}`;
    }),
    ...result.shape.terms.slice(1).map(({ name: term, percent, standardError }) => {
      const error = standardError === null ? '' : ` ± ${formatPercent(standardError, 3)}`;
      return `  ${term.padEnd(28)} ${formatPercent(percent, 3)}${error}`;
    }),
    ...result.features.map(({ description }) => `  stays in: ${description}`),
    ...result.bad.map(
      ({ x_mm, y_mm, value, reason }) =>
        `  bad: ${reason} at ${x_mm}, ${y_mm} mm${value === null ? '' : ` (${value})`}`,
    ),
  ];
}
