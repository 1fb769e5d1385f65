import { Mark, type MarkShape } from './mark';
import styles from './stream-charts.module.css';

const marks: readonly { shape: MarkShape; words: string }[] = [
  { shape: 'dot', words: 'measured' },
  { shape: 'diamond', words: 'signal' },
  { shape: 'ringed-diamond', words: 'out of specification' },
  { shape: 'ring', words: 'late, measured again or not complete' },
  { shape: 'cross', words: 'left out' },
];

/** What the marks, lines and bands of the charts mean; `shown` are the mark shapes in sight. */
export function ChartKey(props: {
  shown: ReadonlySet<MarkShape>;
  /** False where a filtered view draws none. */
  limits: boolean;
  expected: boolean;
  provisional: boolean;
  interval: boolean;
}) {
  return (
    <ul className={styles.key} aria-label="Key to the charts">
      {marks
        .filter(({ shape }) => props.shown.has(shape))
        .map(({ shape, words }) => (
          <li key={shape}>
            <svg width="18" height="16" aria-hidden="true">
              <Mark x={9} y={8} shape={shape} size={2} />
            </svg>
            {words}
          </li>
        ))}
      {props.limits && (
        <li>
          <Line dash={null} />
          limits and centre line
        </li>
      )}
      {props.provisional && (
        <li>
          <Line dash="5 4" />
          provisional limits
        </li>
      )}
      {props.interval && (
        <li>
          <Swatch fill="var(--stat)" opacity={0.3} />
          90 % interval of a limit not yet established
        </li>
      )}
      {props.expected && (
        <>
          <li>
            <Swatch fill="url(#hatch-expected)" opacity={1} />
            expected ± its standard uncertainty (k = 1)
          </li>
          <li>
            <svg width="24" height="16" aria-hidden="true">
              <path
                d="M4 6V2H10M14 2H20V6M4 10V14H10M14 14H20V10"
                fill="none"
                style={{ stroke: 'var(--phys)' }}
              />
            </svg>
            tolerance of the target
          </li>
        </>
      )}
    </ul>
  );
}

function Line({ dash }: { dash: string | null }) {
  return (
    <svg width="24" height="16" aria-hidden="true">
      <line
        x2="22"
        y1="8"
        y2="8"
        style={{ stroke: 'var(--stat)' }}
        strokeWidth={1.3}
        strokeDasharray={dash ?? undefined}
      />
    </svg>
  );
}

function Swatch({ fill, opacity }: { fill: string; opacity: number }) {
  return (
    <svg width="24" height="16" aria-hidden="true">
      <rect
        y="2"
        width="22"
        height="12"
        fill={fill}
        style={fill.startsWith('var') ? { fill, fillOpacity: opacity } : {}}
      />
    </svg>
  );
}
