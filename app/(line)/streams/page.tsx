import type { Metadata } from 'next';
import Link from 'next/link';
import { ButtonLink } from '@/app/_ui/button-link';
import { DataTable } from '@/app/_ui/data-table';
import { EmptyState } from '@/app/_ui/empty-state';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';
import { foundStreams } from '@/lib/excursions/found-streams';
import { listStreams } from '@/lib/streams/data';

export const metadata: Metadata = { title: 'Streams' };

/** Every stream, those out of use too: the board shows how those in use stand. */
export default async function StreamsPage(props: { searchParams: Promise<{ find?: string | string[] }> }) {
  const asked = (await props.searchParams).find;
  const find = (Array.isArray(asked) ? asked[0] : asked)?.trim().slice(0, 100) ?? '';
  const streams = await listStreams(await signedIn('see-line'), { retired: true });
  const found = foundStreams(streams, find);
  const retired = streams.filter((stream) => stream.retiredAt !== null).length;
  const count = find === '' ? String(found.length) : `${found.length} of ${streams.length}`;
  return (
    <>
      <PageHead
        answer={`${count} ${streams.length === 1 ? 'stream' : 'streams'}${find === '' ? '' : ` with “${find}”`}`}
        sub={
          streams.length === 0
            ? 'None is set up yet.'
            : retired === 0
              ? 'All of them are in use.'
              : `${retired} of them out of use.`
        }
        back={{ href: '/', label: 'Board' }}
      />
      {streams.length === 0 ? (
        <EmptyState
          what="Each step, tool, chamber, recipe and target that is watched will be a stream here."
          how="Set one up, then send its wafer maps."
        >
          <ButtonLink href="/setup" weight="main">
            Go to the setup
          </ButtonLink>
        </EmptyState>
      ) : (
        <DataTable
          caption="Streams"
          captionUnseen
          rows={found}
          rowKey={(stream) => stream.id}
          empty="No stream has these words in its name, tool, chamber, step or recipe."
          download={{
            href: `/api/streams.csv?find=${encodeURIComponent(find)}`,
            label: 'These streams as CSV',
          }}
          columns={[
            {
              key: 'name',
              head: 'Stream',
              cell: ({ slug, name }) => (
                <Link href={`/streams/${slug}`} prefetch={false}>
                  {name}
                </Link>
              ),
            },
            { key: 'step', head: 'Step', cell: ({ step }) => step },
            {
              key: 'tool',
              head: 'Tool',
              cell: ({ tool, chamber }) => [tool, chamber].filter(Boolean).join(', '),
            },
            { key: 'recipe', head: 'Recipe', cell: ({ recipe }) => recipe },
            { key: 'plan', head: 'Plan', cell: ({ plan }) => plan.name },
            {
              key: 'state',
              head: 'State',
              cell: ({ retiredAt }) => (retiredAt === null ? 'in use' : 'out of use'),
            },
          ]}
        />
      )}
    </>
  );
}
