import type { BoardRow } from '@/lib/excursions/board-rows';
import { toMeasureWords } from '@/lib/excursions/stream-state';
import { formatAge } from '@/lib/format';
import { carried } from './board-row-props';

/** What stands under the board's answer: the longest unanswered case, the newest wafer, wafers to measure again. */
export function boardSub(rows: readonly Pick<BoardRow, 'stream'>[], now: Date): string | undefined {
  const streams = rows.map((row) => row.stream);
  const earliest = Math.min(
    ...streams.map(({ oldestUnansweredAt }) => oldestUnansweredAt?.getTime() ?? Infinity),
  );
  const newest = streams
    .flatMap((stream) => stream.newest ?? [])
    .sort((a, b) => b.measuredAt.getTime() - a.measuredAt.getTime())[0];
  const age = (since: number) => formatAge(Math.max(0, now.getTime() - since));
  const again = toMeasureWords(streams.reduce((total, stream) => total + stream.toMeasureAgain.length, 0));
  const cases = streams.reduce((total, stream) => total + stream.unansweredCases, 0);
  const said = [
    earliest < Infinity && cases === 1 && `One case nobody has answered, for ${age(earliest)}`,
    earliest < Infinity && cases > 1 && `${cases} cases nobody has answered, the oldest for ${age(earliest)}`,
    newest && `Newest wafer ${carried(newest)}, measured ${age(newest.measuredAt.getTime())} ago`,
    again,
  ].filter(Boolean);
  return said.length === 0 ? undefined : `${said.join('. ')}.`;
}
