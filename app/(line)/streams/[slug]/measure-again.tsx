import Link from 'next/link';
import { SectionHead } from '@/app/_ui/section-head';
import { MeasureAgainTable } from '../../measure-again/measure-again-table';
import type { StreamView } from './stream-view';

const MOST_WAFERS = 20;

/** Wafers of the stretch that were recorded but not judged, and not measured again since; nothing when there are none. */
export function MeasureAgain({ view }: { view: StreamView }) {
  const { toMeasure, timeZone, settings } = view;
  if (toMeasure.length === 0) return null;
  const all = `/measure-again?stream=${settings.stream.slug}`;
  return (
    <section>
      <SectionHead id="measure-again" aside={<Link href={all}>All of this stream</Link>}>
        To be measured again
      </SectionHead>
      <MeasureAgainTable
        caption={
          toMeasure.length > MOST_WAFERS
            ? `The newest ${MOST_WAFERS} of this stretch that were recorded, not judged`
            : 'Wafers of this stretch that were recorded, not judged'
        }
        wafers={toMeasure.slice(0, MOST_WAFERS)}
        timeZone={timeZone}
      />
    </section>
  );
}
