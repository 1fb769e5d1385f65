import type { Metadata } from 'next';
import { EmptyState } from '@/app/_ui/empty-state';
import { PageHead } from '@/app/_ui/page-head';
import { Pager } from '@/app/_ui/pager';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { listExcursions } from '@/lib/excursions/data';
import { excursionQuery } from '@/lib/excursions/schema';
import { listAddress } from '../list-address';
import { excursionsAnswer } from './excursions-answer';
import { ExcursionFilters } from './excursion-filters';
import { ExcursionTable } from './excursion-table';

export const metadata: Metadata = { title: 'Excursions' };

const A_PAGE = 50;

export default async function ExcursionsPage(props: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const query = excursionQuery.parse(await props.searchParams);
  const { state, stream, page } = query;
  const skip = (page - 1) * A_PAGE;
  const found = await listExcursions(await signedIn('see-line'), { state, stream, skip, most: A_PAGE + 1 });
  const excursions = found.excursions.slice(0, A_PAGE);
  const isMore = found.excursions.length > A_PAGE;
  return (
    <>
      <PageHead {...excursionsAnswer(found, stream)} />
      <ExcursionFilters query={query} counts={found.counts} streams={found.streams} />
      {excursions.length === 0 ? (
        <EmptyState
          what={found.streams.length === 0 ? 'There is no excursion yet.' : 'No excursion is of this kind.'}
          how="A signal on a stream's charts opens an excursion by itself, or joins one that is not closed. Here it is answered, investigated and closed with its cause."
        />
      ) : (
        <ExcursionTable
          excursions={excursions}
          now={new Date()}
          timeZone={readEnvironment().siteTimeZone}
          download={listAddress('/api/excursions/csv', { ...query, page: 1 })}
        />
      )}
      {(page > 1 || isMore) && (
        <Pager
          label="Excursions"
          where={`${skip + Math.min(1, excursions.length)} to ${skip + excursions.length}`}
          newer={page > 1 ? listAddress('/excursions', { ...query, page: page - 1 }) : null}
          older={isMore ? listAddress('/excursions', { ...query, page: page + 1 }) : null}
        />
      )}
    </>
  );
}
