import { RadialPlot } from '@/app/_charts/radial-plot';
import { SectionHead } from '@/app/_ui/section-head';
import { formatNumber } from '@/lib/format';
import { mapViewValues } from '@/lib/maps/wafer-map-view';
import { waferTitle } from '@/lib/maps/wafer-title';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The same numbers as the map's, against the distance from the centre, before what physics expects. */
export function RadiusPart({ shown }: { shown: WaferShown }) {
  const { study, view, scale } = shown;
  const { stream } = shown.settings;
  const drawn = mapViewValues(view, { ...study, meanOfSites: shown.meanOfSites }, scale);
  if ('gap' in drawn) return null;
  const band = expectedBand(shown);
  return (
    <section aria-labelledby="radius">
      <SectionHead id="radius">Along the radius</SectionHead>
      <RadialPlot
        title={`${waferTitle(shown.wafer.facts)} along the radius`}
        unit={view === 'value' ? shown.unit : '%'}
        sites={stream.plan.sites}
        values={drawn.values}
        status={study.status}
        radiusMm={stream.plan.diameterMm / 2}
        expected={band}
        mean={view === 'value' ? (study.statistic ?? 0) / scale : view === 'mean' ? 0 : null}
        mode={view === 'value' ? 'value' : 'difference'}
      />
      {band !== null && study.against !== null && (
        <p className={styles.note}>
          Expected is known to ± {formatNumber(study.against.expected.uncertaintyPercent, 2)}&nbsp;%, one
          standard uncertainty (k = 1), hatched where it lies in the plot. It raises no signal.
        </p>
      )}
    </section>
  );
}

/** What physics expects, in the numbers of the view; null where the view has no place for it. */
function expectedBand({ study, view, scale }: WaferShown) {
  const { against, statistic } = study;
  if (against === null || statistic === null || view === 'usual') return null;
  const { value, uncertaintyPercent } = against.expected;
  const seen = (share: number) => {
    if (view === 'value') return (value * share) / scale;
    return view === 'expected' ? 100 * (share - 1) : 100 * ((value * share) / statistic - 1);
  };
  const part = uncertaintyPercent / 100;
  return { value: seen(1), lower: seen(1 - part), upper: seen(1 + part) };
}
