import type { ReactNode } from 'react';
import styles from './data-table.module.css';

export interface DataColumn<Row> {
  key: string;
  head: ReactNode;
  /** Quieter, after the head. */
  unit?: string;
  align?: 'left' | 'right';
  cell: (row: Row) => ReactNode;
}

/**
 * A plain table. The first column names its row. It scrolls sideways inside itself on a narrow screen, by key too;
 * `download` is an address that gives the same rows as a file.
 */
export function DataTable<Row>(props: {
  caption: string;
  /** The caption is read by screen readers only, where a heading already says it. */
  captionUnseen?: boolean;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  empty?: ReactNode;
  download?: { href: string; label: string };
}) {
  const { columns, rows } = props;
  return (
    <div className={styles.holder}>
      <div className={styles.scroller} role="region" aria-label={props.caption} tabIndex={0}>
        <table>
          <caption className={props.captionUnseen ? 'unseen' : undefined}>{props.caption}</caption>
          <thead>
            <tr>
              {columns.map((column) => (
                <th key={column.key} scope="col" data-align={column.align ?? 'left'}>
                  {column.head}
                  {column.unit !== undefined && <span className="unit"> {column.unit}</span>}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={props.rowKey(row)}>
                {columns.map((column, at) =>
                  at === 0 ? (
                    <th key={column.key} scope="row" data-align={column.align ?? 'left'}>
                      {column.cell(row)}
                    </th>
                  ) : (
                    <td key={column.key} data-align={column.align ?? 'left'}>
                      {column.cell(row)}
                    </td>
                  ),
                )}
              </tr>
            ))}
          </tbody>
        </table>
        {rows.length === 0 && <p className="quiet">{props.empty ?? 'Nothing yet.'}</p>}
      </div>
      {props.download && (
        <p className="small">
          <a href={props.download.href} download>
            {props.download.label}
          </a>
        </p>
      )}
    </div>
  );
}
