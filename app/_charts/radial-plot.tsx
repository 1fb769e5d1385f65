import { scaleLinear } from 'd3-scale';
import { useId } from 'react';
import type { SiteStatus } from '@/lib/wafer/measure-wafer';
import type { Site } from '@/lib/wafer/site';
import { radialDomain } from './radial-domain';
import styles from './radial-plot.module.css';

export interface RadialPlotProps {
  /** What is plotted, for the accessible name: "W-2207 along the radius". */
  title: string;
  unit: string;
  sites: readonly Site[];
  values: readonly (number | null)[];
  status: readonly SiteStatus[];
  /** The end of the axis, mm; the outermost site without. */
  radiusMm: number | null;
  /** What physics expects, in the unit of the values. */
  expected: { value: number; lower: number; upper: number } | null;
  /** The wafer's own mean, drawn as a grey line. */
  mean: number | null;
  mode: 'value' | 'difference';
}

const W = 460;
const H = 220;
const box = { left: 58, right: 8, top: 20, bottom: 24 };

/** Readings against their distance from the centre, before the hatched band of what physics expects. */
export function RadialPlot(props: RadialPlotProps) {
  const id = useId();
  const { sites, values, status, expected, mean, unit } = props;
  const points = sites.flatMap((site, i) => {
    const value = values[i];
    return typeof value === 'number' && Number.isFinite(value)
      ? [{ site, value, radiusMm: Math.hypot(site.xMm, site.yMm), status: status[i] ?? 'good' }]
      : [];
  });
  const good = points.filter((p) => p.status === 'good');
  if (good.length === 0) return <p className={styles['note']}>No good reading to plot.</p>;
  const domain = radialDomain(
    good.map((p) => p.value),
    expected,
  );
  const y = scaleLinear([domain.least, domain.most], [H - box.bottom, box.top]);
  const within = (value: number) => Math.min(domain.most, Math.max(domain.least, value));
  const endMm = props.radiusMm ?? Math.max(...points.map((p) => p.radiusMm), 1);
  const x = scaleLinear([0, endMm], [box.left + 4, W - box.right]);
  const yTicks = y.ticks(5);
  const tickText = y.tickFormat(5, props.mode === 'difference' ? '+' : undefined);
  const format = (value: number) => (value === 0 ? '0' : tickText(value));
  const words = `${props.title}: ${good.length} good readings from ${format(Math.min(...good.map((p) => p.value)))} to ${format(Math.max(...good.map((p) => p.value)))} ${unit}${
    expected === null ? '' : `; expected ${expected.lower.toPrecision(4)} to ${expected.upper.toPrecision(4)}`
  }`;
  const bandTop = expected === null ? 0 : y(within(expected.upper));
  const hidden = points.filter(
    (p) => p.status !== 'good' && (p.value < y.domain()[0]! || p.value > y.domain()[1]!),
  );
  return (
    <svg className={styles['plot']} role="img" aria-label={words} viewBox={`0 0 ${W} ${H}`}>
      <defs>
        <pattern
          id={`${id}-expected`}
          width="5"
          height="5"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <rect width="5" height="5" style={{ fill: 'var(--physwash)' }} />
          <line y2="5" style={{ stroke: 'var(--phys)', strokeOpacity: 0.45, strokeWidth: 1 }} />
        </pattern>
      </defs>
      <text x={box.left} y={11}>
        {unit}
      </text>
      {yTicks.map((tick) => (
        <g key={tick}>
          <line
            x1={box.left}
            x2={W - box.right}
            y1={y(tick)}
            y2={y(tick)}
            style={{ stroke: 'var(--rule)' }}
          />
          <text x={box.left - 6} y={y(tick) + 4} textAnchor="end">
            {format(tick)}
          </text>
        </g>
      ))}
      {expected !== null && (
        <g>
          <rect
            x={box.left}
            width={W - box.right - box.left}
            y={bandTop}
            height={Math.max(1, y(within(expected.lower)) - bandTop)}
            fill={`url(#${id}-expected)`}
          />
          {domain.beyond === null ? (
            <line
              x1={box.left}
              x2={W - box.right}
              y1={y(expected.value)}
              y2={y(expected.value)}
              style={{ stroke: 'var(--phys)' }}
            />
          ) : null}
          <text
            className={styles['expected']}
            x={box.left + 66}
            y={domain.beyond === null ? y(expected.value) - 4 : 11}
          >
            expected
            {domain.beyond === null ? '' : ` lies ${domain.beyond}, at ${format(expected.value)}`}
          </text>
        </g>
      )}
      {mean !== null && mean > y.domain()[0]! && mean < y.domain()[1]! && (
        <g>
          <line
            x1={box.left}
            x2={W - box.right}
            y1={y(mean)}
            y2={y(mean)}
            style={{ stroke: 'var(--stat)' }}
          />
          <text className={styles['halo']} x={box.left + 24} y={y(mean) - 4}>
            mean
          </text>
        </g>
      )}
      {x.ticks(5).map((tick) => (
        <text key={tick} x={x(tick)} y={H - 6} textAnchor={x(tick) > W - 24 ? 'end' : 'middle'}>
          {tick === 0 ? '0 mm' : tick}
        </text>
      ))}
      {points.map((p) => (
        <RadialMark
          key={`${p.site.xMm},${p.site.yMm}`}
          x={x(p.radiusMm)}
          y={Math.min(H - box.bottom, Math.max(box.top, y(p.value)))}
          status={p.status}
          words={`${p.value.toPrecision(5)} ${unit} at ${p.radiusMm.toFixed(1)} mm${p.status === 'good' ? '' : `, ${p.status}`}`}
        />
      ))}
      {hidden.length > 0 && (
        <text x={W - box.right} y={11} textAnchor="end">
          {hidden.length} crossed: off the scale
        </text>
      )}
    </svg>
  );
}

function RadialMark({ x, y, status, words }: { x: number; y: number; status: SiteStatus; words: string }) {
  if (status === 'good' || status === 'excluded') {
    const open = status === 'excluded';
    return (
      <circle
        cx={x}
        cy={y}
        r={2}
        style={{
          fill: open ? 'var(--paper)' : 'var(--ink)',
          stroke: 'var(--ink)',
          strokeWidth: open ? 1 : 0,
        }}
      >
        <title>{words}</title>
      </circle>
    );
  }
  return (
    <path d={`M${x - 3} ${y - 3}l6 6m0 -6l-6 6`} style={{ stroke: 'var(--call)', strokeWidth: 1.4 }}>
      <title>{words}</title>
    </path>
  );
}
