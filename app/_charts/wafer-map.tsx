import { useId } from 'react';
import { drawnSurface, type Place } from '@/lib/wafer/drawn-surface';
import type { SiteStatus } from '@/lib/wafer/measure-wafer';
import type { Site } from '@/lib/wafer/site';
import { isolineLabels } from './isoline-labels';
import { mapColour } from './map-colour';
import { mapLevels, type MapLevels, stepShare } from './map-levels';
import { MapScale } from './map-scale';
import { mapWords } from './map-words';
import { waferOutline } from './wafer-outline';
import styles from './wafer-map.module.css';

export interface WaferMapProps {
  /** What the map is of, for its accessible name: "W-2207, resistivity". */
  title: string;
  /** What the colours say, beside the scale: "resistivity", "against expected". */
  label: string;
  unit: string;
  sites: readonly Site[];
  /** In the order of the sites: readings, or differences already taken. */
  values: readonly (number | null)[];
  status: readonly SiteStatus[];
  diameterMm: number | null;
  orientation: 'notch' | 'flat';
  mode: 'value' | 'difference';
  /** One standard deviation of the gauge, in the unit of the values: the surface is smoothed no more than that. */
  repeatability: number;
  /** One scale for maps shown side by side; its own without. */
  levels?: MapLevels;
  /** The largest diameter shown beside it, so that wafers keep their sizes. */
  toScaleOfMm?: number;
  /** Drawn small, as one of many: coarser, and its isolines bear no labels, which could not be read. */
  small?: boolean;
}

const R = 100;

/** A wafer's map: contours between the sites, hatched where nothing is known, sites as dots, bad ones crossed. */
export function WaferMap(props: WaferMapProps) {
  const { sites, values, status, diameterMm, mode, unit } = props;
  const id = useId();
  const good = sites.flatMap((site, i) => {
    const value = values[i];
    return status[i] === 'good' && typeof value === 'number' && Number.isFinite(value)
      ? [{ site, value }]
      : [];
  });
  const outermostMm = Math.max(...sites.map((s) => Math.hypot(s.xMm, s.yMm)), 0);
  const radiusMm = diameterMm === null ? outermostMm * 1.04 || 1 : diameterMm / 2;
  const share = props.toScaleOfMm === undefined ? 1 : (2 * radiusMm) / props.toScaleOfMm;
  /** A small wafer's words and marks are drawn as large as a big one's. */
  const magnify = props.small === true ? 1 : 1 / share;
  const tenths = (10 * R) / radiusMm;
  const place = ([x, y]: Place) => `${Math.round(tenths * x) / 10} ${Math.round(-tenths * y) / 10}`;
  const path = (ring: readonly Place[]) => `M${ring.map(place).join('L')}Z`;
  const levels =
    good.length === 0
      ? null
      : (props.levels ??
        mapLevels(
          good.map((g) => g.value),
          mode,
        ));
  const text = (value: number) =>
    (mode === 'difference' && value > 0 ? '+' : '') +
    value
      .toFixed(levels?.decimals ?? 2)
      .replace(/^-(?=.*[1-9])/, '−')
      .replace(/^-/, '');
  const readingText = (value: number) =>
    (mode === 'difference' && value > 0 ? '+' : '') +
    value.toFixed((levels?.decimals ?? 2) + 1).replace('-', '−');
  const inner = levels === null ? [] : levels.edges.slice(1, -1);
  const surface =
    levels === null
      ? null
      : drawnSurface(
          good.map((g) => g.site),
          good.map((g) => g.value),
          { repeatability: props.repeatability, levels: inner, ...(props.small ? { cells: 32 } : {}) },
        );
  const isolines = levels === null ? [] : inner.filter((edge) => Math.round(edge / levels.step) % 2 === 0);
  const labels =
    surface === null || props.small === true
      ? []
      : isolineLabels(
          surface,
          isolines,
          sites.map((s): Place => [s.xMm, s.yMm]),
          radiusMm * magnify,
        );
  const colour = (step: number) =>
    levels === null ? 'none' : mapColour(stepShare(levels, step, mode), mode);
  const taken = {
    bad: status.filter((s) => s !== 'good' && s !== 'excluded').length,
    excluded: status.filter((s) => s === 'excluded').length,
  };
  const words = mapWords(props.title, good, taken, radiusMm, (value) => `${readingText(value)} ${unit}`);
  const dot = (sites.length > 150 ? 0.8 : 1.3) * magnify;

  return (
    <figure className={styles['map']}>
      <div className={styles['frame']}>
        <svg
          className={styles['drawing']}
          role="img"
          aria-label={words}
          viewBox={`${-R - 2} ${-R - 2} ${2 * R + 4} ${2 * R + 4}`}
          style={{ width: `${(100 * share).toFixed(2)}%` }}
        >
          <defs>
            <pattern
              id={`${id}-unknown`}
              width="4"
              height="4"
              patternUnits="userSpaceOnUse"
              patternTransform="rotate(-45)"
            >
              <line y2="4" style={{ stroke: 'var(--edge)', strokeOpacity: 0.55, strokeWidth: 0.6 }} />
            </pattern>
            {surface !== null && (
              <clipPath id={`${id}-hull`}>
                <path d={path(surface.hull)} />
              </clipPath>
            )}
          </defs>
          <path
            d={
              diameterMm === null
                ? `M${R} 0A${R} ${R} 0 1 1 ${R} -0.01Z`
                : waferOutline(diameterMm, props.orientation, R)
            }
            fill={`url(#${id}-unknown)`}
            style={diameterMm === null ? {} : { stroke: 'var(--ink)', strokeWidth: 0.7 }}
          />
          {surface !== null && (
            <g clipPath={`url(#${id}-hull)`}>
              <path d={path(surface.hull)} style={{ fill: colour(0) }} />
              {surface.regions.map(({ level, rings }, i) => (
                <path
                  key={level}
                  d={rings.map(path).join('')}
                  fillRule="evenodd"
                  style={{
                    fill: colour(i + 1),
                    stroke: 'var(--map-ink)',
                    strokeOpacity: isolines.includes(level) ? 0.75 : 0,
                    strokeWidth: level === 0 && mode === 'difference' ? 0.9 : 0.45,
                  }}
                />
              ))}
            </g>
          )}
          {props.small && <SmallDots places={good.map((g) => place([g.site.xMm, g.site.yMm]))} size={dot} />}
          {sites.map((site, i) =>
            props.small && status[i] === 'good' ? null : (
              <SiteMark
                key={`${site.xMm},${site.yMm}`}
                x={(R * site.xMm) / radiusMm}
                y={(-R * site.yMm) / radiusMm}
                size={dot}
                status={status[i] ?? 'good'}
                words={siteWords(site, values[i] ?? null, status[i] ?? 'good', readingText, unit)}
              />
            ),
          )}
          {labels.map(({ level, place: [x, y] }) => (
            <text
              key={`${level},${x},${y}`}
              className={styles['label']}
              x={(R * x) / radiusMm}
              y={(-R * y) / radiusMm + 2.2 * magnify}
              style={{ fontSize: 6.4 * magnify, strokeWidth: 2 * magnify }}
            >
              {text(level)}
            </text>
          ))}
        </svg>
      </div>
      {levels === null ? (
        <p className={styles['note']}>No good reading to draw.</p>
      ) : (
        <MapScale
          levels={levels}
          mode={mode}
          unit={unit}
          label={props.label}
          text={text}
          small={props.small ?? false}
        />
      )}
      {surface === null && levels !== null && (
        <p className={styles['note']}>These sites span no area: no surface is drawn between them.</p>
      )}
    </figure>
  );
}

function siteWords(
  site: Site,
  value: number | null,
  status: SiteStatus,
  text: (value: number) => string,
  unit: string,
): string {
  const reading = value === null || !Number.isFinite(value) ? 'no reading' : `${text(value)} ${unit}`;
  const why =
    status === 'good' ? '' : status === 'excluded' ? ', in the edge exclusion' : `, taken out: ${status}`;
  return `${reading} at x ${site.xMm.toFixed(1)}, y ${site.yMm.toFixed(1)} mm${why}`;
}

/** All good sites of a small map in one stroke: of fifty maps each site must not be an element of its own. */
function SmallDots({ places, size }: { places: readonly string[]; size: number }) {
  const style = { stroke: 'var(--map-ink)', strokeWidth: 2 * size, strokeLinecap: 'round' } as const;
  return <path d={places.map((at) => `M${at}h0`).join('')} style={style} />;
}

function SiteMark(props: { x: number; y: number; size: number; status: SiteStatus; words: string }) {
  const { x, y, size, status, words } = props;
  if (status === 'good' || status === 'excluded') {
    const fill = status === 'good' ? 'var(--map-ink)' : 'var(--map-halo)';
    const stroke = status === 'good' ? 'var(--map-halo)' : 'var(--map-ink)';
    return (
      <circle cx={x} cy={y} r={size} style={{ fill, stroke, strokeWidth: 0.5 }}>
        <title>{words}</title>
      </circle>
    );
  }
  const arm = size + 1.4;
  const cross = `M${x - arm} ${y - arm}l${2 * arm} ${2 * arm}m0 ${-2 * arm}l${-2 * arm} ${2 * arm}`;
  return (
    <g>
      <title>{words}</title>
      <path d={cross} style={{ stroke: 'var(--map-halo)', strokeWidth: 2.4 }} />
      <path d={cross} style={{ stroke: 'var(--call)', strokeWidth: 1.1 }} />
    </g>
  );
}
