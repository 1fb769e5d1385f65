import type { Metadata } from 'next';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { findFirstLevels, listLimitRevisions } from '@/lib/limits/data';
import { siteTimeField } from '@/lib/site-time';
import { foundStream } from '../../../found-stream';
import { StreamHead } from '../../../stream-head';
import { chartedText } from './charted-text';
import { DraftFromSpan } from './draft-from-span';
import { InheritedForm } from './inherited-form';
import { LimitTable } from './limit-table';
import { isStuck, limitsAnswer, revisionInForce } from './limits-answer';
import { PendingLimits } from './pending-limits';

export const metadata: Metadata = { title: 'Limits' };

export default async function LimitsPage(props: {
  params: Promise<{ slug: string }>;
  searchParams: Promise<Record<string, string | string[]>>;
}) {
  const actor = await signedIn('see-line');
  const { stream } = await foundStream(actor, props.params);
  const revisions = await listLimitRevisions(actor, stream.id);
  const { siteTimeZone: timeZone } = readEnvironment();
  const now = new Date();
  const current = revisionInForce(revisions, now);
  const begun = current === null ? await findFirstLevels(actor, stream.id) : null;
  const text = chartedText(stream);
  const nowField = siteTimeField(now, timeZone);
  return (
    <>
      <StreamHead stream={stream} place="Limits" answer={limitsAnswer(stream.name, current, begun)} />
      {begun !== null && isStuck(begun) && (
        <p>
          Levels that never vary mean a stuck gauge or copied readings: look there first. Limits come by
          themselves of the 25 subgroups that begin with the last of the equal ones; until then nothing but
          the specification judges.
        </p>
      )}
      <PendingLimits
        stream={stream}
        revisions={revisions}
        current={current}
        text={text}
        now={nowField}
        timeZone={timeZone}
      />
      <SectionHead id="revisions">Revisions</SectionHead>
      <LimitTable
        slug={stream.slug}
        revisions={revisions}
        current={current}
        text={text}
        timeZone={timeZone}
      />
      <SectionHead id="draft">Draw up limits from a span of subgroups</SectionHead>
      <DraftFromSpan
        actor={actor}
        stream={stream}
        current={current}
        asked={await props.searchParams}
        text={text}
        timeZone={timeZone}
      />
      <SectionHead id="inherited">Enter limits that were in use before</SectionHead>
      <IfMay permission="draft-limits" streamId={stream.id}>
        <InheritedForm
          slug={stream.slug}
          unit={text.unit}
          hasBetween={stream.subgroupSize > 1}
          now={nowField}
          timeZone={timeZone}
        />
      </IfMay>
    </>
  );
}
