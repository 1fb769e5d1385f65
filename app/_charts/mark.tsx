/**
 * The marks of every chart, told apart by shape: a dot is measured, a diamond needs a person, a cross is left out,
 * a ring is late, re-measured or not complete, a ringed diamond is out of specification.
 */
export type MarkShape = 'dot' | 'diamond' | 'cross' | 'ring' | 'ringed-diamond';

export function Mark({ x, y, shape, size = 2 }: { x: number; y: number; shape: MarkShape; size?: number }) {
  const ink = { fill: 'var(--ink)' };
  const call = { fill: 'var(--call)' };
  if (shape === 'dot') return <circle cx={x} cy={y} r={size} style={ink} />;
  if (shape === 'ring') {
    return (
      <circle
        cx={x}
        cy={y}
        r={size + 0.8}
        style={{ fill: 'var(--paper)', stroke: 'var(--ink)' }}
        strokeWidth={1.2}
      />
    );
  }
  if (shape === 'cross') {
    const arm = size + 1;
    return (
      <path
        d={`M${x - arm} ${y - arm}l${2 * arm} ${2 * arm}m0 ${-2 * arm}l${-2 * arm} ${2 * arm}`}
        style={{ stroke: 'var(--quiet)' }}
        strokeWidth={1.4}
      />
    );
  }
  const half = size + 2.6;
  const diamond = (
    <path d={`M${x} ${y - half}l${half} ${half}l${-half} ${half}l${-half} ${-half}z`} style={call} />
  );
  if (shape === 'diamond') return diamond;
  return (
    <g>
      <circle cx={x} cy={y} r={half + 3} fill="none" style={{ stroke: 'var(--call)' }} strokeWidth={1.4} />
      {diamond}
    </g>
  );
}
