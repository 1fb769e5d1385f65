import type { BoardRowProps } from '@/app/_charts/board-row';
import type { BoardRow } from '@/lib/excursions/board-rows';
import { whoWords } from '@/lib/excursions/excursion-words';
import { toMeasureWords } from '@/lib/excursions/stream-state';
import { formatAge, formatNumber, formatPercent, formatSignedPercent } from '@/lib/format';

type Drawn = Omit<BoardRowProps, 'cases'> & {
  cases: { id: string; words: string } | null;
  also: string | null;
};

/** What one row of the board draws and says. `reachPercent` is the scale that all rows share. */
export function boardRowProps(row: BoardRow, now: Date, reachPercent: number): Drawn {
  const { stream, strip, state } = row;
  const age = (since: Date) => formatAge(Math.max(0, now.getTime() - since.getTime()));
  const { worst } = stream;
  const needsPerson = state.group === 'needs-someone';
  return {
    href: `/streams/${stream.slug}`,
    name: stream.name,
    place: [stream.tool, stream.chamber, `${stream.diameterMm} mm`].filter(Boolean).join(' · '),
    strip: { ...strip, points: strip.points },
    expected: expectedProps(row, reachPercent),
    evenness: evennessProps(row),
    newest: stream.newest && {
      href: `/wafers/${stream.newest.id}`,
      name: carried(stream.newest),
      age: age(stream.newest.measuredAt),
    },
    state: { needsPerson, words: state.words },
    cases: worst
      ? {
          id: worst.id,
          words: [
            whoWords(worst),
            age(worst.openedAt),
            ...(stream.openCases > 1 ? [`${stream.openCases - 1} more`] : []),
          ].join(' · '),
        }
      : null,
    also: worst ? toMeasureWords(stream.toMeasureAgain.length) : null,
  };
}

/** A wafer with the run or lot that carried it: "20 (M0011)". */
export function carried({ wafer, runOrLot }: { wafer: string; runOrLot: string }): string {
  return runOrLot === '' ? wafer : `${wafer} (${runOrLot})`;
}

function expectedProps({ expected, stream, calls }: BoardRow, reachPercent: number) {
  if (expected === null) return null;
  const { dopantPercent, differencePercent, tolerancePercent } = expected;
  const symbol = stream.target?.target.quantity === 'resistivity' ? 'ρ' : 'Rs';
  const difference = formatSignedPercent(differencePercent);
  return {
    differencePercent: dopantPercent,
    uncertaintyPercent: expected.uncertaintyDopantPercent,
    tolerancePercent:
      tolerancePercent === null ? null : { lower: -tolerancePercent, upper: tolerancePercent },
    reachPercent,
    call: calls.level,
    text: formatSignedPercent(dopantPercent),
    unit: 'dopant',
    under: `${difference} ${symbol}`,
    label: `Level ${difference} against expected, known to ${formatNumber(expected.uncertaintyPercent, 2)}\u00a0%; as dopant ${formatSignedPercent(dopantPercent)}${
      tolerancePercent === null ? '' : `, tolerance ± ${formatPercent(tolerancePercent, 0)}`
    }`,
  };
}

function evennessProps({ evenness, calls }: BoardRow) {
  const { nowPercent, usual } = evenness;
  const text = formatPercent(nowPercent);
  const range = usual && `${formatPercent(usual.lowerPercent)} to ${formatPercent(usual.upperPercent)}`;
  return {
    nowPercent,
    usual,
    call: calls.within,
    text,
    label: `Evenness ${text}${range === null ? ', no usual range yet' : `, usually ${range}`}`,
  };
}

/**
 * The half-width of the gauges' common scale: the smallest round number that holds the level and tolerance of four
 * rows in five, so that one stray row does not flatten the others.
 */
export function commonReach(rows: readonly Pick<BoardRow, 'expected'>[]): number {
  const wanted = rows
    .flatMap(({ expected }) =>
      expected === null ? [] : Math.max(Math.abs(expected.dopantPercent), expected.tolerancePercent ?? 0),
    )
    .sort((a, b) => a - b);
  const most = wanted[Math.ceil(wanted.length * 0.8) - 1] ?? 5;
  return [2, 5, 10, 20, 50, 100].find((reach) => reach >= most) ?? 100;
}
