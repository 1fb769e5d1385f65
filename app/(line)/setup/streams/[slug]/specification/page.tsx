import type { Metadata } from 'next';
import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { siteTimeField } from '@/lib/site-time';
import { inForce } from '@/lib/streams/in-force';
import { effectiveWords } from '../../../effective-words';
import { foundStream } from '../../../found-stream';
import { StreamHead } from '../../../stream-head';
import { specificationWords } from '../../../words';
import { SpecificationForm } from './form';

export const metadata: Metadata = { title: 'Specification' };

export default async function SpecificationPage(props: { params: Promise<{ slug: string }> }) {
  const { stream, specifications } = await foundStream(await signedIn('see-line'), props.params);
  const { siteTimeZone } = readEnvironment();
  const now = new Date();
  const current = inForce(specifications, now)?.specification ?? null;
  return (
    <>
      <StreamHead
        stream={stream}
        place="Specification"
        answer={
          current === null
            ? `Nothing is specified for ${stream.name}`
            : `${stream.name}: ${specificationWords(current, stream.quantity)}`
        }
      />
      <p className="quiet">
        What a customer or the next step accepts. It is neither the target&#39;s tolerance nor the control
        limits, and a wafer outside it outranks every rule.
      </p>
      <SectionHead id="revisions">Revisions</SectionHead>
      <DataTable
        caption="Specification revisions"
        captionUnseen
        rows={specifications.toReversed()}
        rowKey={(row) => row.id}
        empty="None yet: no wafer can be out of specification."
        download={{
          href: `/api/setup/streams/${stream.slug}/specifications`,
          label: 'Specification revisions as CSV',
        }}
        columns={[
          { key: 'revision', head: 'revision', cell: (row) => row.revision },
          {
            key: 'specification',
            head: 'accepted',
            cell: (row) => specificationWords(row.specification, stream.quantity),
          },
          {
            key: 'from',
            head: 'in force from',
            cell: (row) => effectiveWords(row.effectiveFrom, siteTimeZone),
          },
          { key: 'author', head: 'by', cell: (row) => row.author },
          { key: 'reason', head: 'why', cell: (row) => row.reason },
        ]}
      />
      <SectionHead id="new">A new revision</SectionHead>
      <IfMay permission="revise-specification" streamId={stream.id}>
        <SpecificationForm
          slug={stream.slug}
          quantity={stream.quantity}
          specification={current}
          now={siteTimeField(now, siteTimeZone)}
          timeZone={siteTimeZone}
        />
      </IfMay>
    </>
  );
}
