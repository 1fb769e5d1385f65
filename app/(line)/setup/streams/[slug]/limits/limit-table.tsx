import { DataTable, type DataColumn } from '@/app/_ui/data-table';
import { formatDateTime, formatPercent } from '@/lib/format';
import { ORIGIN_WORDS, type LimitRevision } from '@/lib/limits/types';
import type { ChartedText } from './charted-text';
import { ageWord, baselineWords } from './limits-answer';

/** Every revision of a stream's limits, newest first, with who drew it up and who approved it. */
export function LimitTable(props: {
  slug: string;
  revisions: readonly LimitRevision[];
  current: LimitRevision | null;
  text: ChartedText;
  timeZone: string;
}) {
  const { text, timeZone, current } = props;
  const by = (who: string, when: Date, why: string) => (
    <>
      {who}, {formatDateTime(when, timeZone)}
      <br />
      <span className="quiet">{why}</span>
    </>
  );
  const level = (key: 'lower' | 'centre' | 'upper', head: string): DataColumn<LimitRevision> => ({
    key,
    head,
    align: 'right',
    cell: (row) => text.level(row.limits.level[key]),
  });
  return (
    <DataTable
      caption="Limit revisions"
      captionUnseen
      rows={props.revisions}
      rowKey={(row) => row.id}
      empty="None yet. The first 25 judged subgroups make a provisional revision by themselves; limits from elsewhere can be entered below."
      download={{ href: `/api/setup/streams/${props.slug}/limits`, label: 'Limit revisions as CSV' }}
      columns={[
        {
          key: 'revision',
          head: 'revision',
          cell: (row) => (
            <>
              {row.revision}
              {row.id === current?.id && <span className="quiet">, in force</span>}
            </>
          ),
        },
        {
          key: 'state',
          head: 'state',
          cell: (row) => (
            <>
              {row.state}
              {row.state === 'approved' && `, ${ageWord(row)}`}
              <br />
              <span className="quiet">
                {ORIGIN_WORDS[row.origin]}, {baselineWords(row)}
              </span>
            </>
          ),
        },
        {
          key: 'from',
          head: 'in force from',
          cell: (row) => forceWords(row, timeZone),
        },
        level('lower', 'level, lower'),
        level('centre', 'centre'),
        level('upper', 'upper'),
        {
          key: 'range',
          head: 'range, upper',
          align: 'right',
          cell: (row) => text.range(row.limits.movingRange.upper),
        },
        {
          key: 'within',
          head: 'within: lower, upper',
          cell: ({ limits: { within } }) =>
            within === null ? '—' : `${formatPercent(within.lower)}, ${formatPercent(within.upper)}`,
        },
        { key: 'author', head: 'drawn up', cell: (row) => by(row.author, row.draftedAt, row.reason) },
        {
          key: 'approved',
          head: 'approved',
          cell: (row) =>
            row.approvedAt === null
              ? '—'
              : by(row.approvedBy ?? '', row.approvedAt, row.approvalReason ?? ''),
        },
      ]}
    />
  );
}

/** From when to when a revision judges; its end is told where no later revision tells it. */
function forceWords({ state, effectiveFrom, supersededFrom }: LimitRevision, timeZone: string): string {
  if (state === 'draft' || state === 'discarded') return '—';
  const from = formatDateTime(effectiveFrom, timeZone);
  if (supersededFrom === null) return from;
  return supersededFrom <= effectiveFrom
    ? 'never: another was approved for all it would judge'
    : `${from}, until another was approved from ${formatDateTime(supersededFrom, timeZone)}`;
}
