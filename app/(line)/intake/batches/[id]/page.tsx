import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Notice } from '@/app/_ui/notice';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { formatDateTime } from '@/lib/format';
import { findBatch, listBatchStreams, listRefusals } from '@/lib/maps/data';
import { batchSentence } from './batch-sentence';
import { RefusalTable } from './refusal-table';
import { StreamTable } from './stream-table';

export const metadata: Metadata = { title: 'Batch' };

const ORIGIN_WORDS = {
  page: 'the intake page',
  command: 'the command line',
  network: 'the network',
  demonstration: 'the program',
};

export default async function BatchPage(props: { params: Promise<{ id: string }> }) {
  const actor = await signedIn('see-line');
  const batch = await findBatch(actor, (await props.params).id);
  if (batch === null) notFound();
  const [streams, refusals] = await Promise.all([
    listBatchStreams(actor, batch.id),
    listRefusals(actor, batch.id),
  ]);
  const { siteTimeZone } = readEnvironment();
  const { startedAt, finishedAt } = batch;
  return (
    <>
      <PageHead
        answer={batchSentence(batch)}
        sub={`${batch.source}, taken ${formatDateTime(startedAt, siteTimeZone)} by ${batch.actor} from ${ORIGIN_WORDS[batch.origin]}.`}
        back={{ href: '/intake', label: 'Intake' }}
      />
      {batch.history && (
        <Notice kind="note">
          History: these wafers are shown and can make limits, but open no excursions.
        </Notice>
      )}
      {finishedAt === null && (
        <Notice kind="note">
          This batch is still being recorded, or was cut short. Sending the same file again records what is
          missing and nothing twice.
        </Notice>
      )}
      {streams.length > 0 && <StreamTable batchId={batch.id} streams={streams} timeZone={siteTimeZone} />}
      {refusals.length > 0 && <RefusalTable batchId={batch.id} refusals={refusals} />}
    </>
  );
}
