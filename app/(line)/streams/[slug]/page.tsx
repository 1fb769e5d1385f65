import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { PackedStreamCharts } from '@/app/_charts/packed-stream-charts';
import { ButtonLink } from '@/app/_ui/button-link';
import { EmptyState } from '@/app/_ui/empty-state';
import { Notice } from '@/app/_ui/notice';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { findStreamSettings } from '@/lib/streams/data';
import { AlongCrystal } from './along-crystal';
import { chartProps } from './chart-props';
import { MeasureAgain } from './measure-again';
import { OfTheTool } from './of-the-tool';
import { pageWords, spanNotices } from './page-words';
import { SpanFilter } from './span-filter';
import { type SearchWords, spanWish } from './span-wish';
import { StreamCases } from './stream-cases';
import { StreamFacts } from './stream-facts';
import { readStreamView } from './stream-view';
import { WaferTable } from './wafer-table';

interface Props {
  params: Promise<{ slug: string }>;
  searchParams: Promise<SearchWords>;
}

/** Read once for the title and the page. */
const settingsOf = cache(async (slug: string) =>
  /^[a-z0-9][a-z0-9-]*$/.test(slug) ? findStreamSettings(await signedIn('see-line'), slug) : null,
);

export async function generateMetadata(props: Props): Promise<Metadata> {
  return { title: (await settingsOf((await props.params).slug))?.stream.name ?? 'No such stream' };
}

export default async function StreamPage(props: Props) {
  const actor = await signedIn('see-line');
  const settings = await settingsOf((await props.params).slug);
  if (settings === null) notFound();
  const timeZone = readEnvironment().siteTimeZone;
  const { wish, notices } = spanWish(await props.searchParams, timeZone);
  const view = await readStreamView(actor, settings, wish, { timeZone, now: new Date() });
  const charts = chartProps(view);
  const beside = (
    <>
      <StreamCases view={view} />
      <StreamFacts view={view} />
    </>
  );
  return (
    <>
      <PageHead {...pageWords(view)} back={{ href: '/', label: 'Board' }} />
      {[...notices, ...spanNotices(view)].map((notice) => (
        <Notice key={notice} kind="note">
          {notice}
        </Notice>
      ))}
      {view.span.whole !== null && <SpanFilter view={view} />}
      {charts !== null ? (
        <PackedStreamCharts {...charts} key={JSON.stringify(wish)}>
          {beside}
        </PackedStreamCharts>
      ) : (
        <div className="with-beside">
          <NoPoints isEmpty={view.span.whole === null} slug={settings.stream.slug} />
          <aside>{beside}</aside>
        </div>
      )}
      <AlongCrystal view={view} />
      <OfTheTool actor={actor} stream={settings.stream} />
      <WaferTable view={view} />
      <MeasureAgain view={view} />
    </>
  );
}

function NoPoints({ isEmpty, slug }: { isEmpty: boolean; slug: string }) {
  return (
    <EmptyState
      what={
        isEmpty
          ? 'The charts of this stream will stand here: level, moving range, spread within the wafer.'
          : 'No subgroup of this stream lies in this stretch, or none matches the filter.'
      }
      how={isEmpty ? 'They begin with its first wafer map.' : 'Look at the latest subgroups instead.'}
    >
      <ButtonLink href={isEmpty ? '/intake' : `/streams/${slug}`} weight="main">
        {isEmpty ? 'Send a wafer-map file' : 'Show the latest'}
      </ButtonLink>
    </EmptyState>
  );
}
