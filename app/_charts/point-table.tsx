'use client';

import Link from 'next/link';
import { useState } from 'react';
import { DataTable } from '../_ui/data-table';
import type { StreamChartPoint } from './stream-chart-point';
import styles from './stream-charts.module.css';

/** The drawn points as a table, newest first; its rows are made when it is opened. */
export function PointTable(props: {
  points: readonly StreamChartPoint[];
  wordsOf: (point: StreamChartPoint) => readonly string[];
  hasBetween: boolean;
  download?: { href: string; label: string };
}) {
  const [open, setOpen] = useState(false);
  return (
    <details className={styles.table} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>The points as a table</summary>
      {open && (
        <DataTable
          caption="The points of the charts, newest first"
          captionUnseen
          rows={props.points.toReversed()}
          rowKey={(point) => point.id}
          {...(props.download && { download: props.download })}
          columns={[
            {
              key: 'point',
              head: 'Point',
              cell: (point) => (
                <Link href={point.href} prefetch={false}>
                  {point.label}
                </Link>
              ),
            },
            { key: 'at', head: 'Processed', cell: (point) => point.texts.at },
            { key: 'level', head: 'Level', align: 'right', cell: (point) => point.texts.level },
            {
              key: 'range',
              head: 'Moving range',
              align: 'right',
              cell: (point) => point.texts.movingRange ?? '—',
            },
            {
              key: 'within',
              head: 'Within wafer',
              align: 'right',
              cell: (point) => point.texts.within ?? '—',
            },
            ...(props.hasBetween
              ? [
                  {
                    key: 'between',
                    head: 'Between wafers',
                    align: 'right' as const,
                    cell: (point: StreamChartPoint) => point.texts.between ?? '—',
                  },
                ]
              : []),
            { key: 'signals', head: 'Signals', cell: (point) => props.wordsOf(point).join(' · ') || 'none' },
          ]}
        />
      )}
    </details>
  );
}
