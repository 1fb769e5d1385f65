import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Suspense } from 'react';
import { PageHead } from '@/app/_ui/page-head';
import { Waiting } from '@/app/_ui/waiting';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { findFileHeader } from '@/lib/maps/file-header';
import { givenWords } from '@/lib/maps/schema';
import { findWaitingFile } from '@/lib/maps/waiting-file';
import { listStreams } from '@/lib/streams/data';
import { CheckResult } from './check-result';

export const metadata: Metadata = { title: 'Check of a file' };

interface Props {
  params: Promise<{ token: string }>;
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function CheckPage(props: Props) {
  const actor = await signedIn('record-maps');
  const file = await findWaitingFile(actor, (await props.params).token);
  if (file === null) notFound();
  const { siteTimeZone } = readEnvironment();
  const given = givenWords(await props.searchParams, siteTimeZone);
  const [header, streams] = await Promise.all([findFileHeader(actor, file), listStreams(actor)]);
  const megabytes = (file.bytes / 1e6).toFixed(0);
  const words =
    file.bytes > 20e6
      ? `Every row of ${megabytes} MB is read. This takes about a minute for 200 MB; the result appears here.`
      : 'Every row is read before anything is recorded.';
  return (
    <Suspense
      key={JSON.stringify(given.typed)}
      fallback={
        <>
          <PageHead answer={`Checking ${file.name}…`} back={{ href: '/intake', label: 'Intake' }} />
          <Waiting words={words} />
        </>
      }
    >
      <CheckResult {...{ actor, file, given, header, streams }} timeZone={siteTimeZone} />
    </Suspense>
  );
}
