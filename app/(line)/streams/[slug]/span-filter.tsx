import Link from 'next/link';
import { Beside } from '@/app/_ui/beside';
import { Button } from '@/app/_ui/button';
import { Field, SelectField } from '@/app/_ui/field';
import { Notice } from '@/app/_ui/notice';
import { streamHref } from './span-wish';
import styles from './stream-page.module.css';
import type { StreamView } from './stream-view';

const distinct = (words: readonly (string | null)[]) =>
  [...new Set(words.filter((word) => word !== null))].sort((a, b) =>
    a.localeCompare(b, 'en', { numeric: true }),
  );

/** Gauge and lot, kept in the address. It is a plain form: it works without script. */
export function SpanFilter({ view }: { view: StreamView }) {
  const { wish, wafers, settings, span } = view;
  const { slug } = settings.stream;
  const gauges = distinct([...wafers.map((wafer) => wafer.gauge), wish.gauge]);
  const lots = distinct(wafers.map((wafer) => wafer.lot));
  const words = [wish.gauge && `read on ${wish.gauge}`, wish.lot && `of lot ${wish.lot}`].filter(Boolean);
  return (
    <>
      {view.isFiltered && (
        <Notice kind="note">
          Only subgroups with a wafer {words.join(' and ')}: {span.points.length} of {span.inSpan} in this
          stretch. No limits and no rules are drawn, for they were made for the whole stream; the moving range
          runs from one shown subgroup to the next.{' '}
          <Link href={streamHref(slug, { ...wish, gauge: null, lot: null })}>Show all</Link>
        </Notice>
      )}
      <Beside summary="Filter by gauge or lot" open={view.isFiltered}>
        <form action={`/streams/${slug}`} className={styles.filter} aria-label="Filter">
          {wish.from !== null && <input type="hidden" name="from" value={wish.from.toISOString()} />}
          {wish.to !== null && <input type="hidden" name="to" value={wish.to.toISOString()} />}
          <SelectField name="gauge" label="Gauge" defaultValue={wish.gauge ?? ''}>
            <option value="">any</option>
            {gauges.map((gauge) => (
              <option key={gauge}>{gauge}</option>
            ))}
          </SelectField>
          <Field name="lot" label="Lot" defaultValue={wish.lot ?? ''} list="lots" maxLength={100} />
          <datalist id="lots">
            {lots.map((lot) => (
              <option key={lot} value={lot} />
            ))}
          </datalist>
          <Button type="submit">Show these</Button>
        </form>
      </Beside>
    </>
  );
}
