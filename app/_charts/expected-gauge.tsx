import { linearScale } from './linear-scale';
import { Mark } from './mark';

export interface ExpectedGaugeProps {
  /** Level against expected, in percent; null where either is undefined. */
  differencePercent: number | null;
  /** Half-width of the expectation's uncertainty, in percent. */
  uncertaintyPercent: number;
  /** The target's tolerance about expected, in percent; drawn apart from the uncertainty, as brackets. */
  tolerancePercent: { lower: number; upper: number } | null;
  /** Half-width of the scale in percent: the same on all rows that are compared. */
  reachPercent: number;
  /** The stream needs a person because of its level. */
  call: boolean;
  /** The gauge in words, for those who hear it. */
  label: string;
}

const width = 120;
const height = 30;

/** Level against what physics expects: a hatched band for the uncertainty, brackets for the tolerance, one mark. */
export function ExpectedGauge(props: ExpectedGaugeProps) {
  const { reachPercent: reach, tolerancePercent: tolerance, differencePercent: difference } = props;
  const x = linearScale([-reach, reach], [8, width - 8], { clamp: true });
  const left = x(-props.uncertaintyPercent);
  const beyond = difference !== null && Math.abs(difference) > reach;
  return (
    <svg
      role="img"
      aria-label={props.label}
      viewBox={`0 0 ${width} ${height}`}
      style={{ width: '100%', maxWidth: width, overflow: 'visible' }}
    >
      <line x1={0} x2={width} y1={height / 2} y2={height / 2} style={{ stroke: 'var(--rule)' }} />
      <rect
        x={left}
        y={9}
        width={x(props.uncertaintyPercent) - left}
        height={12}
        fill="url(#hatch-expected)"
      />
      <line x1={x(0)} x2={x(0)} y1={6} y2={24} style={{ stroke: 'var(--phys)' }} strokeWidth={1.5} />
      {tolerance !== null &&
        ([tolerance.lower, tolerance.upper] as const).map((edge, at) =>
          Math.abs(edge) > reach ? null : (
            <path
              key={at}
              d={`M${x(edge) + (at === 0 ? 4 : -4)} 3H${x(edge)}V27h${at === 0 ? 4 : -4}`}
              fill="none"
              style={{ stroke: 'var(--phys)' }}
            />
          ),
        )}
      {difference !== null && (
        <>
          <Mark
            x={x(difference)}
            y={height / 2}
            shape={props.call ? 'diamond' : 'dot'}
            size={props.call ? 2.6 : 4}
          />
          {beyond && (
            <path
              d={difference > 0 ? `M${width - 2} 10l5 5l-5 5` : `M2 10l-5 5l5 5`}
              fill="none"
              style={{ stroke: props.call ? 'var(--call)' : 'var(--ink)' }}
              strokeWidth={1.4}
            />
          )}
        </>
      )}
    </svg>
  );
}
