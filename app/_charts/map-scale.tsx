import { mapColour } from './map-colour';
import { stepShare, type MapLevels } from './map-levels';
import styles from './wafer-map.module.css';

export interface MapScaleProps {
  levels: MapLevels;
  mode: 'value' | 'difference';
  unit: string;
  /** What the colours say: "resistivity", "against the mean". */
  label: string;
  text: (value: number) => string;
  /** Narrow, with room for a few values only. */
  small?: boolean;
}

/** The scale bar of a map: a step of colour for every step of the value, with the values where it changes. */
export function MapScale({ levels, mode, unit, label, text, small }: MapScaleProps) {
  const steps = levels.edges.length - 1;
  const every = Math.ceil(levels.edges.length / (small ? 4 : 7));
  const middle = mode === 'difference' ? levels.edges.findIndex((edge) => edge === 0) : 0;
  return (
    <div className={styles['scale']} aria-hidden="true">
      {label}, {unit}
      <div className={styles['swatches']}>
        {levels.edges.slice(0, -1).map((edge, i) => (
          <span key={edge} style={{ background: mapColour(stepShare(levels, i, mode), mode) }} />
        ))}
      </div>
      <div className={styles['edges']}>
        {levels.edges.map((edge, i) =>
          (i - middle) % every === 0 ? (
            <span
              key={edge}
              data-end={i === steps ? '' : undefined}
              style={{ left: `${((100 * i) / steps).toFixed(2)}%` }}
            >
              {text(edge)}
            </span>
          ) : null,
        )}
      </div>
    </div>
  );
}
