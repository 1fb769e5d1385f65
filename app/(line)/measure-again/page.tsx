import type { Metadata } from 'next';
import { Button } from '@/app/_ui/button';
import { EmptyState } from '@/app/_ui/empty-state';
import { SelectField } from '@/app/_ui/field';
import { PageHead } from '@/app/_ui/page-head';
import { Pager } from '@/app/_ui/pager';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { listMeasureAgain } from '@/lib/excursions/data';
import { measureAgainQuery } from '@/lib/excursions/schema';
import styles from '../excursions/excursion-filters.module.css';
import { listAddress } from '../list-address';
import { measureAgainAnswer } from './measure-again-answer';
import { MeasureAgainTable } from './measure-again-table';

export const metadata: Metadata = { title: 'Measure again' };

const A_PAGE = 50;

/** Every wafer that waits to be measured again, however long ago it was recorded. */
export default async function MeasureAgainPage(props: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const { stream, page } = measureAgainQuery.parse(await props.searchParams);
  const skip = (page - 1) * A_PAGE;
  const actor = await signedIn('see-line');
  const { wafers, streams } = await listMeasureAgain(actor, { stream, skip, most: A_PAGE });
  const asked = streams.filter((one) => stream === null || one.slug === stream);
  const count = asked.reduce((total, one) => total + one.count, 0);
  const address = (other: number) => listAddress('/measure-again', { stream, page: other });
  return (
    <>
      <PageHead
        back={{ href: '/', label: 'Board' }}
        answer={measureAgainAnswer(count, stream === null ? null : (asked[0]?.name ?? stream))}
        sub="Recorded and kept, but not judged. A wafer leaves this list when a later measurement of it, under the same run or lot, is judged, or when it is judged itself, as after a reading was put back."
      />
      {streams.length > 0 && (
        <form action="/measure-again" className={styles.stream}>
          <SelectField key={stream} name="stream" label="Stream" defaultValue={stream ?? ''}>
            <option value="">all streams in use</option>
            {streams.map((one) => (
              <option key={one.slug} value={one.slug}>
                {one.name} ({one.count})
              </option>
            ))}
          </SelectField>
          <Button type="submit">Show</Button>
        </form>
      )}
      {wafers.length === 0 ? (
        <EmptyState
          what={
            count === 0
              ? 'Wafers that are recorded but cannot be judged will stand here.'
              : 'The list ends before this page.'
          }
          how="That is so of a wafer with too few good sites, or with more bad ones than are taken out by themselves."
        />
      ) : (
        <MeasureAgainTable
          caption="Wafers to measure again, the newest first"
          captionUnseen
          wafers={wafers}
          timeZone={readEnvironment().siteTimeZone}
          further={[
            {
              key: 'sites',
              head: 'Good sites',
              align: 'right',
              cell: ({ goodSites, countedSites }) => `${goodSites} of ${countedSites}`,
            },
            { key: 'gauge', head: 'Gauge', cell: ({ gauge }) => gauge ?? '—' },
          ]}
          download={{
            href: listAddress('/api/measure-again', { stream, page: 1 }),
            label: count === 1 ? 'This wafer as CSV' : `All ${count} as CSV`,
          }}
        />
      )}
      {(page > 1 || skip + wafers.length < count) && (
        <Pager
          label="Wafers to measure again"
          where={`${skip + Math.min(1, wafers.length)} to ${skip + wafers.length} of ${count}`}
          newer={page > 1 ? address(page - 1) : null}
          older={skip + wafers.length < count ? address(page + 1) : null}
        />
      )}
    </>
  );
}
