import type { Metadata } from 'next';
import { EmptyState } from '@/app/_ui/empty-state';
import { PageHead } from '@/app/_ui/page-head';
import { Pager } from '@/app/_ui/pager';
import { signedIn } from '@/app/page-actor';
import { listAuditEntries } from '@/lib/access/audit-trail';
import { auditQuery } from '@/lib/access/schema';
import { readEnvironment } from '@/lib/env';
import { formatDateTime } from '@/lib/format';
import { listStreams } from '@/lib/streams/data';
import { auditAddress } from './audit-address';
import { AuditFilters } from './audit-filters';
import { AuditTable } from './audit-table';

export const metadata: Metadata = { title: 'Audit trail' };

const A_PAGE = 50;

export default async function AuditPage(props: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const actor = await signedIn('read-audit');
  const timeZone = readEnvironment().siteTimeZone;
  const query = auditQuery(timeZone).parse(await props.searchParams);
  const skip = (query.page - 1) * A_PAGE;
  const [found, streams] = await Promise.all([
    listAuditEntries(actor, query, { skip, most: A_PAGE + 1 }),
    listStreams(actor, { retired: true }),
  ]);
  const entries = found.slice(0, A_PAGE);
  const isMore = found.length > A_PAGE;
  const [newest] = entries;
  const at = (page: number) => auditAddress('/audit', { ...query, page }, timeZone);
  return (
    <>
      <PageHead
        answer={
          newest === undefined
            ? 'Nothing of this kind is on record'
            : `${newest.actorName} ${newest.action}, ${formatDateTime(newest.at, timeZone)}`
        }
        sub="Who did what, when and why, in the transaction of what was done. Entries are never changed: npx evenohm audit --verify follows their chain and names any place where it does not hold."
        back={{ href: '/setup', label: 'Setup' }}
      />
      <AuditFilters query={query} streams={streams} timeZone={timeZone} />
      {entries.length === 0 ? (
        <EmptyState
          what="Each change will stand here: maps recorded, cases answered, limits approved, people signed in."
          how="Ask for more: any person, any stream, any time."
        />
      ) : (
        <AuditTable
          entries={entries}
          timeZone={timeZone}
          download={auditAddress('/api/audit.csv', { ...query, page: 1 }, timeZone)}
        />
      )}
      {(query.page > 1 || isMore) && (
        <Pager
          label="Audit trail"
          where={`${skip + Math.min(1, entries.length)} to ${skip + entries.length}`}
          newer={query.page > 1 ? at(query.page - 1) : null}
          older={isMore ? at(query.page + 1) : null}
        />
      )}
    </>
  );
}
