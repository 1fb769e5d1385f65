import type { Metadata } from 'next';
import { Beside } from '@/app/_ui/beside';
import { PageHead } from '@/app/_ui/page-head';
import { Pager } from '@/app/_ui/pager';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { formatAge } from '@/lib/format';
import { listBatches } from '@/lib/maps/data';
import { MOST_FILE_BYTES } from '@/lib/maps/waiting-file';
import { newestSentence } from './batches/[id]/batch-sentence';
import { BatchTable } from './batch-table';
import { FileForm } from './file-form';
import { UploadForm } from './upload-form';

export const metadata: Metadata = { title: 'Intake' };

const A_PAGE = 25;

export default async function IntakePage(props: { searchParams: Promise<{ before?: string }> }) {
  const asked = (await props.searchParams).before ?? '';
  const before = /^\d{1,18}$/.test(asked) ? asked : null;
  const found = await listBatches(await signedIn('see-line'), { before, most: A_PAGE + 1 });
  const batches = found.slice(0, A_PAGE);
  const [newest] = before === null ? batches : [];
  const last = batches.at(-1);
  return (
    <>
      <PageHead
        answer={newest === undefined ? 'Send a wafer-map file' : newestSentence(newest)}
        sub={
          newest === undefined
            ? 'It is read and drawn first; you decide then whether it is recorded.'
            : `${newest.source}, ${formatAge(Date.now() - newest.startedAt.getTime())} ago, by ${newest.actor}.`
        }
      />
      <IfMay permission="record-maps">
        <UploadForm mostBytes={MOST_FILE_BYTES} />
      </IfMay>
      <Beside summary="What a wafer-map file holds">
        <FileForm />
      </Beside>
      <SectionHead id="batches">Recorded and refused</SectionHead>
      <BatchTable batches={batches} timeZone={readEnvironment().siteTimeZone} />
      {(before !== null || found.length > A_PAGE) && (
        <Pager
          label="Batches"
          where={`${batches.length} shown`}
          newer={before === null ? null : '/intake'}
          older={found.length > A_PAGE && last ? `/intake?before=${last.id}#batches` : null}
        />
      )}
    </>
  );
}
