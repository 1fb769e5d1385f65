import { WaferMap } from '@/app/_charts/wafer-map';
import { EmptyState } from '@/app/_ui/empty-state';
import { SectionHead } from '@/app/_ui/section-head';
import { Tabs } from '@/app/_ui/tabs';
import { MAP_VIEWS, mapViewValues } from '@/lib/maps/wafer-map-view';
import { waferTitle } from '@/lib/maps/wafer-title';
import { GAP_WORDS, VIEW_NAMES, viewNote } from './map-words';
import { waferHref } from './wafer-href';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The map in one of its views, what its colours mean, and what is to be seen on it. */
export function MapPart({ shown }: { shown: WaferShown }) {
  const { wafer, study, view, scale } = shown;
  const { stream } = shown.settings;
  const drawn = mapViewValues(view, { ...study, meanOfSites: shown.meanOfSites }, scale);
  const quantity = stream.quantity === 'resistivity' ? 'resistivity' : 'sheet resistance';
  const label = view === 'value' ? quantity : VIEW_NAMES[view].toLowerCase();
  return (
    <section aria-labelledby="map">
      <SectionHead id="map">Map</SectionHead>
      <Tabs
        label="What the map shows"
        tabs={MAP_VIEWS.map((one) => ({
          href: waferHref(wafer.id, one),
          name: VIEW_NAMES[one],
          current: one === view,
        }))}
      />
      {'gap' in drawn ? (
        <EmptyState {...GAP_WORDS[drawn.gap]} />
      ) : (
        <>
          <WaferMap
            title={`${waferTitle(wafer.facts)}, ${label}`}
            label={label}
            unit={view === 'value' ? shown.unit : '%'}
            sites={stream.plan.sites}
            values={drawn.values}
            status={study.status}
            diameterMm={stream.plan.diameterMm}
            orientation={stream.plan.orientation}
            mode={view === 'value' ? 'value' : 'difference'}
            repeatability={
              view === 'value'
                ? ((study.statistic ?? 0) / scale) * (stream.repeatabilityPercent / 100)
                : stream.repeatabilityPercent
            }
            toScaleOfMm={shown.largestDiameterMm}
          />
          {study.statistic !== null && <p className={styles.note}>{viewNote(shown)}</p>}
        </>
      )}
      {study.features.length > 0 && (
        <>
          <SectionHead level={3}>Pointed out</SectionHead>
          <ul className={styles.list}>
            {study.features.map(({ description }) => (
              <li key={description}>{description}.</li>
            ))}
          </ul>
          <p className={styles.note}>
            Readings that deviate together are on the wafer: they stay in the figures.
          </p>
        </>
      )}
    </section>
  );
}
