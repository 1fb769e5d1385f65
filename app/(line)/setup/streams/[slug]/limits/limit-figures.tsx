import { DataTable } from '@/app/_ui/data-table';
import type { LimitSet } from '@/lib/control/limit-set';
import { formatPercent, formatSignedPercent } from '@/lib/format';
import type { ChartedText } from './charted-text';

interface Row {
  name: string;
  candidate: string;
  current: string;
  difference: string;
}

/** A set of limits beside the one in force, figure by figure. */
export function LimitFigures(props: {
  caption: string;
  candidate: LimitSet;
  current: LimitSet | null;
  text: ChartedText;
}) {
  const rows = limitRows(props.candidate, props.current, props.text);
  return (
    <div style={{ maxWidth: 760 }}>
      <DataTable
        caption={props.caption}
        rows={rows}
        rowKey={(row) => row.name}
        columns={[
          { key: 'name', head: 'limit', cell: (row) => row.name },
          { key: 'candidate', head: 'these', align: 'right', cell: (row) => row.candidate },
          { key: 'current', head: 'in force', align: 'right', cell: (row) => row.current },
          { key: 'difference', head: 'difference', align: 'right', cell: (row) => row.difference },
        ]}
      />
    </div>
  );
}

function limitRows(candidate: LimitSet, current: LimitSet | null, text: ChartedText): Row[] {
  const percent = (value: number | null) => formatPercent(value, 2);
  const isPercent = text.unit === '%';
  const row = (
    name: string,
    of: (limits: LimitSet) => number | null,
    format: (value: number | null) => string,
    level = false,
  ): Row => {
    const [these, those] = [of(candidate), current && of(current)];
    const both = these !== null && those !== null;
    const difference = !both
      ? '—'
      : level && isPercent
        ? formatSignedPercent(these - those, 2)
        : formatSignedPercent(those === 0 ? null : 100 * (these / those - 1), 2);
    return { name, candidate: format(these), current: format(those), difference };
  };
  return [
    row('level, upper', (l) => l.level.upper, text.level, true),
    row('level, centre line', (l) => l.level.centre, text.level, true),
    row('level, lower', (l) => l.level.lower, text.level, true),
    row('σ of the level', (l) => l.level.sigma, text.range),
    row('moving range, upper', (l) => l.movingRange.upper, text.range),
    row('within wafer, upper', (l) => l.within?.upper ?? null, percent),
    row('within wafer, lower', (l) => l.within?.lower ?? null, percent),
    ...(candidate.between === null && (current?.between ?? null) === null
      ? []
      : [row('between wafers, upper', (l) => l.between?.upper ?? null, text.range)]),
  ];
}
