import { linearScale } from './linear-scale';
import { Mark } from './mark';

export interface EvennessGaugeProps {
  /** Within-wafer spread of the newest wafer, in percent; null where undefined. */
  nowPercent: number | null;
  /** Its usual range (the limits in force); null while there are none. */
  usual: { lowerPercent: number; upperPercent: number } | null;
  call: boolean;
  label: string;
}

const width = 96;
const height = 30;

/**
 * Evenness now against its usual range, on a scale that runs from none to twice the usual upper end,
 * so that the box stands at the same place on every row and only the mark moves.
 */
export function EvennessGauge({ nowPercent, usual, call, label }: EvennessGaugeProps) {
  const middle = height / 2;
  if (usual === null || usual.upperPercent <= 0) {
    return (
      <svg
        role="img"
        aria-label={label}
        viewBox={`0 0 ${width} ${height}`}
        style={{ width: '100%', maxWidth: width }}
      />
    );
  }
  const x = linearScale([0, 2 * usual.upperPercent], [2, width - 8], { clamp: true });
  const left = x(usual.lowerPercent);
  const beyond = nowPercent !== null && nowPercent > 2 * usual.upperPercent;
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`0 0 ${width} ${height}`}
      style={{ width: '100%', maxWidth: width, overflow: 'visible' }}
    >
      <line x1={0} x2={width} y1={middle} y2={middle} style={{ stroke: 'var(--rule)' }} />
      <rect
        x={left}
        y={middle - 5}
        width={x(usual.upperPercent) - left}
        height={10}
        style={{ fill: 'var(--paper)', stroke: 'var(--stat)' }}
      />
      {nowPercent !== null && (
        <Mark x={x(nowPercent)} y={middle} shape={call ? 'diamond' : 'dot'} size={call ? 2.6 : 3.4} />
      )}
      {beyond && (
        <path
          d={`M${width - 1} 10l5 5l-5 5`}
          fill="none"
          style={{ stroke: 'var(--call)' }}
          strokeWidth={1.4}
        />
      )}
    </svg>
  );
}
