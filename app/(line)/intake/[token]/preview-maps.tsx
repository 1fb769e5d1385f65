import { mapLevels } from '@/app/_charts/map-levels';
import { WaferMap } from '@/app/_charts/wafer-map';
import { SectionHead } from '@/app/_ui/section-head';
import { formatDateTime, formatPercent, formatReading, formatSignedPercent } from '@/lib/format';
import type { MapPreview } from '@/lib/maps/map-preview';
import { unitOf } from '@/lib/streams/types';
import styles from './preview-maps.module.css';

/** The first maps of a file, drawn; those of one stream by one scale. */
export function PreviewMaps(props: { previews: readonly MapPreview[]; of: number; timeZone: string }) {
  const { previews } = props;
  const streams = [...new Set(previews.map((preview) => preview.streamSlug))];
  const largestMm = Math.max(...previews.map((preview) => preview.diameterMm));
  const aside = previews.length < props.of ? `the first ${previews.length} of ${props.of}` : undefined;
  return streams.map((slug, at) => {
    const own = previews.filter((preview) => preview.streamSlug === slug);
    const good = own.flatMap(({ values, status }) =>
      values.filter((value, i): value is number => status[i] === 'good' && value !== null),
    );
    const levels = good.length === 0 ? undefined : mapLevels(good, 'value');
    return (
      <section key={slug} aria-labelledby={`maps-${slug}`}>
        <SectionHead id={`maps-${slug}`} aside={at === 0 ? aside : undefined}>
          {own[0]?.streamName}
        </SectionHead>
        <ul className={styles.maps}>
          {own.map((preview, i) => (
            <li key={`${preview.name}-${preview.measuredAt}-${i}`}>
              <WaferMap
                title={preview.name}
                label={preview.quantity === 'resistivity' ? 'resistivity' : 'sheet resistance'}
                unit={unitOf(preview.quantity)}
                sites={preview.sites}
                values={preview.values}
                status={preview.status}
                diameterMm={preview.diameterMm}
                orientation={preview.orientation}
                mode="value"
                repeatability={((preview.level ?? 0) * preview.repeatabilityPercent) / 100}
                toScaleOfMm={largestMm}
                small
                {...(levels === undefined ? {} : { levels })}
              />
              <PreviewWords preview={preview} timeZone={props.timeZone} />
            </li>
          ))}
        </ul>
      </section>
    );
  });
}

function PreviewWords({ preview, timeZone }: { preview: MapPreview; timeZone: string }) {
  const { level, expected, badSites } = preview;
  const against = level === null || expected === null ? null : 100 * (level / expected - 1);
  return (
    <p className="small">
      <strong>{preview.name}</strong>{' '}
      <span className="quiet">{formatDateTime(new Date(preview.measuredAt), timeZone)}</span>
      <br />
      {formatReading(preview.quantity, level)}
      {against !== null && <span className="phys"> {formatSignedPercent(against)} against expected</span>}
      {preview.relativeStandardDeviationPercent !== null &&
        `, s ${formatPercent(preview.relativeStandardDeviationPercent)}`}
      {badSites > 0 && `, ${badSites} bad`}
      {preview.notJudgedReason !== null && (
        <>
          <br />
          <span className="call">
            <span aria-hidden="true">◆ </span>will not be judged: {preview.notJudgedReason}
          </span>
        </>
      )}
    </p>
  );
}
