import type { Metadata } from 'next';
import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { formatAge, formatDateTime } from '@/lib/format';
import { siteTimeField } from '@/lib/site-time';
import { listStreamEvents } from '@/lib/streams/data';
import { foundStream } from '../../../found-stream';
import { StreamHead } from '../../../stream-head';
import { EventForm } from './form';

export const metadata: Metadata = { title: 'Events' };

export default async function EventsPage(props: { params: Promise<{ slug: string }> }) {
  const actor = await signedIn('see-line');
  const { stream } = await foundStream(actor, props.params);
  const events = await listStreamEvents(actor, stream.id);
  const { siteTimeZone } = readEnvironment();
  const now = new Date();
  const newest = events.find((event) => event.at <= now);
  return (
    <>
      <StreamHead
        stream={stream}
        place="Events"
        answer={
          newest === undefined
            ? `Nothing was done to ${stream.tool} on record`
            : `The latest ${newest.kind} on record was ${formatAge(now.getTime() - newest.at.getTime())} ago`
        }
      />
      <SectionHead id="events">Adjustments and maintenance</SectionHead>
      <DataTable
        caption="Adjustments and maintenance"
        captionUnseen
        rows={events}
        rowKey={(event) => event.id}
        empty="None yet. Each will stand on the charts at its time."
        download={{ href: `/api/setup/streams/${stream.slug}/events`, label: 'Events as CSV' }}
        columns={[
          { key: 'at', head: 'when', cell: (event) => formatDateTime(event.at, siteTimeZone) },
          { key: 'kind', head: 'what', cell: (event) => event.kind },
          { key: 'text', head: 'in words', cell: (event) => event.text },
          {
            key: 'restart',
            head: 'rules',
            cell: (event) => (event.restart ? 'begin afresh after it' : 'go on across it'),
          },
          { key: 'actor', head: 'recorded by', cell: (event) => event.actor },
        ]}
      />
      <SectionHead id="new">Record one</SectionHead>
      <IfMay permission="record-event" streamId={stream.id}>
        <EventForm slug={stream.slug} now={siteTimeField(now, siteTimeZone)} timeZone={siteTimeZone} />
      </IfMay>
    </>
  );
}
