import { Figures, type Figure } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { formatPercent, formatSignedPercent } from '@/lib/format';
import { FIGURE_ORDER, figureDefinition } from '@/lib/wafer/figure-definition';
import type { WaferFigures } from '@/lib/wafer/measure-wafer';
import { formatMm } from './format-site';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The figures of the wafer, each with its definition behind its name. */
export function FiguresPart({ shown }: { shown: WaferShown }) {
  const { measure } = shown.study;
  const { plan, controlStatistic } = shown.settings.stream;
  const counted = measure.sites - measure.excludedSites;
  return (
    <section aria-labelledby="figures">
      <SectionHead id="figures">Figures</SectionHead>
      <p className={styles.note}>
        {measure.goodSites} of {counted} sites count
        {measure.excludedSites > 0 && `, ${measure.excludedSites} more lie in the edge exclusion`}. Site plan
        “{plan.name}”, a wafer of {plan.diameterMm} mm, edge exclusion {plan.edgeExclusionMm} mm.
      </p>
      <Figures figures={FIGURE_ORDER.map((name) => figureRow(name, shown, name === controlStatistic))} />
    </section>
  );
}

function figureRow(name: keyof WaferFigures, shown: WaferShown, isCharted: boolean): Figure {
  const { label, definition, source } = figureDefinition(name);
  return {
    name: isCharted ? (
      <>
        {label} <span className="small">(control statistic)</span>
      </>
    ) : (
      label
    ),
    value: figureValue(name, shown),
    definition: `${definition} Source: ${source}.`,
  };
}

function figureValue(name: keyof WaferFigures, shown: WaferShown) {
  const { figures } = shown.study.measure;
  const figure = figures[name];
  if (name === 'radialVariationPercent') return formatSignedPercent(figures[name], 2);
  if (figure === null || typeof figure === 'number') {
    if (figureDefinition(name).unit === 'percent') return formatPercent(figure);
    return shown.reading(figure, name === 'standardDeviation' ? 3 : 4);
  }
  const site = shown.settings.stream.plan.sites[figure.siteIndex];
  if (site === undefined) return shown.reading(figure.value);
  const place = `${formatMm(site.xMm)}, ${formatMm(site.yMm)}`;
  return (
    <>
      {shown.reading(figure.value)} <span className="quiet small">at {place} mm</span>
    </>
  );
}
