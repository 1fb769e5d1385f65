import Link from 'next/link';
import { SectionHead } from '@/app/_ui/section-head';
import { BOARD_POINTS } from '@/lib/excursions/board-streams';
import type { BoardRow } from '@/lib/excursions/board-rows';
import { MeasureAgainTable } from './measure-again/measure-again-table';

/** Wafers that were recorded but not judged lately, and not measured again since; nothing when there are none. */
export function BoardMeasureAgain({ rows, timeZone }: { rows: readonly BoardRow[]; timeZone: string }) {
  const wafers = rows.flatMap(({ stream }) => stream.toMeasureAgain.map((wafer) => ({ ...wafer, stream })));
  if (wafers.length === 0) return null;
  return (
    <section aria-labelledby="measure-again">
      <SectionHead id="measure-again" aside={<Link href="/measure-again">Those from before too</Link>}>
        Recorded, not judged: measure again
      </SectionHead>
      <MeasureAgainTable
        caption={`Wafers to measure again, among the last ${BOARD_POINTS} subgroups of each stream`}
        wafers={wafers}
        timeZone={timeZone}
      />
    </section>
  );
}
