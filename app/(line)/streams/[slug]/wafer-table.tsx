import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { StateMark } from '@/app/_ui/state-mark';
import { MEASURED_AGAIN } from '@/lib/excursions/charted-measurements';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import { formatDateTime, formatPercent, formatReading, formatSignedPercent } from '@/lib/format';
import styles from '../../cells.module.css';
import { WaferLink } from '../../wafer-link';
import { streamHref } from './span-wish';
import type { StreamView } from './stream-view';

const MOST_WAFERS = 12;

/** The newest wafers of the stretch shown. */
export function WaferTable({ view }: { view: StreamView }) {
  const { wafers, settings, timeZone, wish, shown, span } = view;
  const { slug, quantity } = settings.stream;
  if (shown === null || wafers.length === 0) return null;
  return (
    <section>
      <SectionHead id="newest-wafers">The newest wafers of this stretch</SectionHead>
      <DataTable
        caption="The newest wafers of this stretch"
        captionUnseen
        rows={wafers.slice(-MOST_WAFERS).reverse()}
        rowKey={(wafer) => wafer.id}
        download={{
          href: streamHref(slug, { ...wish, ...shown, around: null }, '/api/streams', '/wafers.csv'),
          label: `The wafers of all ${span.points.length} subgroups as CSV`,
        }}
        columns={[
          {
            key: 'wafer',
            head: 'Wafer',
            cell: WaferLink,
          },
          {
            key: 'at',
            head: 'Measured',
            cell: ({ measuredAt }) => (
              <span className={styles.line}>{formatDateTime(new Date(measuredAt), timeZone)}</span>
            ),
          },
          {
            key: 'gauge',
            head: 'Gauge',
            cell: ({ gauge }) => <span className={styles.line}>{gauge ?? '—'}</span>,
          },
          {
            key: 'value',
            head: 'Value',
            align: 'right',
            cell: ({ value }) => formatReading(quantity, value),
          },
          {
            key: 'expected',
            head: 'Against expected',
            align: 'right',
            cell: ({ value, expected }) =>
              formatSignedPercent(value === null || expected === null ? null : 100 * (value / expected - 1)),
          },
          {
            key: 'within',
            head: 'Within wafer',
            unit: '1 s',
            align: 'right',
            cell: ({ within }) => formatPercent(within),
          },
          {
            key: 'bad',
            head: 'Bad sites',
            align: 'right',
            cell: ({ badSites, sites }) => `${badSites} of ${sites}`,
          },
          {
            key: 'state',
            head: 'State',
            cell: (wafer) => <StateMark needsPerson={needsPerson(wafer)}>{stateWords(wafer)}</StateMark>,
          },
        ]}
      />
    </section>
  );
}

function needsPerson({ notJudgedReason, outOfSpecification }: SpanWafer): boolean {
  return outOfSpecification || (notJudgedReason !== null && notJudgedReason !== MEASURED_AGAIN);
}

function stateWords(wafer: SpanWafer): string {
  if (wafer.notJudgedReason !== null) {
    return `${wafer.outOfSpecification ? 'out of specification; ' : ''}not judged: ${wafer.notJudgedReason}`;
  }
  if (wafer.outOfSpecification) return 'out of specification';
  return wafer.isMeasuredAgain ? 'measured again' : 'judged';
}
