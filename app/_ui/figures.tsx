import type { ReactNode } from 'react';
import styles from './figures.module.css';

export interface Figure {
  name: ReactNode;
  /** "—" where the figure is undefined. */
  value: ReactNode;
  /** The definition, at hand behind the name. */
  definition?: ReactNode;
  ink?: 'measured' | 'expected' | 'call';
}

/** Names and values, one a line: the figures of a wafer, the terms of a stream. */
export function Figures({ figures }: { figures: readonly Figure[] }) {
  return (
    <dl className={styles.figures}>
      {figures.map((figure, at) => (
        <div key={at} data-ink={figure.ink ?? 'measured'}>
          <dt>
            {figure.definition === undefined ? (
              figure.name
            ) : (
              <details>
                <summary>{figure.name}</summary>
                <span className="small">{figure.definition}</span>
              </details>
            )}
          </dt>
          <dd>{figure.value}</dd>
        </div>
      ))}
    </dl>
  );
}
