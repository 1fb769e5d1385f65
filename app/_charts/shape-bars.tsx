import { formatPercent, formatSignedPercent } from '@/lib/format';
import type { ShapeTerm } from '@/lib/wafer/measure-wafer';
import styles from './shape-bars.module.css';

export interface ShapeBarsProps {
  /** Shape terms of one wafer; the level is left out, it is not a shape. */
  terms: readonly ShapeTerm[];
  residualPercent: number | null;
  /** One reach for bars shown side by side, percent; its own without. */
  reachPercent?: number;
  /** Between which percents a term usually lies, drawn as a grey band; a term beyond it is said to be. */
  usual?: ReadonlyMap<string, { lowerPercent: number; upperPercent: number }>;
}

/** The shapes of a wafer as bars from zero, each with its standard error as a whisker and in figures. */
export function ShapeBars({ terms, residualPercent, reachPercent, usual }: ShapeBarsProps) {
  const shapes = terms.filter((term) => term.name !== 'level');
  if (shapes.length === 0) {
    return <p className={styles['residual']}>Too few readings count to tell shapes apart.</p>;
  }
  const reach =
    reachPercent ??
    Math.max(
      ...shapes.map((t) => Math.abs(t.percent) + (t.standardError ?? 0)),
      ...shapes.flatMap((t) => Object.values(usual?.get(t.name) ?? {}).map(Math.abs)),
      1e-9,
    );
  const isBeyond = ({ name, percent }: ShapeTerm) => {
    const band = usual?.get(name);
    return band !== undefined && (percent < band.lowerPercent || percent > band.upperPercent);
  };
  const at = (percent: number) => 50 + 50 * Math.max(-1, Math.min(1, percent / reach));
  return (
    <>
      <table className={styles['shapes']}>
        <caption>Shape, percent of the mean, with standard error</caption>
        <tbody>
          {shapes.map(({ name, percent, standardError }) => (
            <tr key={name} data-beyond={isBeyond({ name, percent, standardError })}>
              <th scope="row">
                {name}
                {isBeyond({ name, percent, standardError }) && (
                  <span className={styles['beyond']}> unlike usual</span>
                )}
              </th>
              <td className={styles['bar']} aria-hidden="true">
                <svg width="100%" height="14">
                  <UsualBand band={usual?.get(name)} at={at} />
                  <line x1="50%" x2="50%" y2="14" style={{ stroke: 'var(--edge)' }} />
                  <rect
                    x={`${Math.min(50, at(percent)).toFixed(2)}%`}
                    width={`${Math.abs(at(percent) - 50).toFixed(2)}%`}
                    y={2}
                    height={10}
                    style={{ fill: 'var(--ink)', fillOpacity: 0.8 }}
                  />
                  {standardError !== null && (
                    <line
                      x1={`${at(percent - standardError).toFixed(2)}%`}
                      x2={`${at(percent + standardError).toFixed(2)}%`}
                      y1={7}
                      y2={7}
                      style={{ stroke: 'var(--stat)', strokeWidth: 2 }}
                    />
                  )}
                </svg>
              </td>
              <td className={styles['figure']}>
                {formatSignedPercent(percent, 2)}
                {standardError !== null && (
                  <span className={styles['error']}> ± {formatPercent(standardError, 2)}</span>
                )}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {residualPercent !== null && (
        <p className={styles['residual']}>
          Left by these shapes: {formatPercent(residualPercent, 2)}, one standard deviation
        </p>
      )}
    </>
  );
}

function UsualBand(props: {
  band: { lowerPercent: number; upperPercent: number } | undefined;
  at: (percent: number) => number;
}) {
  if (props.band === undefined) return null;
  const left = props.at(props.band.lowerPercent);
  const width = props.at(props.band.upperPercent) - left;
  return (
    <rect
      x={`${left.toFixed(2)}%`}
      width={`${width.toFixed(2)}%`}
      height={14}
      style={{ fill: 'var(--stat)', fillOpacity: 0.28 }}
    />
  );
}
