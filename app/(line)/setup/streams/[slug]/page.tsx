import type { Metadata } from 'next';
import Link from 'next/link';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { listLatestWafers } from '@/lib/maps/data';
import { isImplantedOrDiffused } from '@/lib/physics/is-implanted-or-diffused';
import { siteTimeField } from '@/lib/site-time';
import { inForce } from '@/lib/streams/in-force';
import { wordsOfTarget } from '@/lib/streams/words-of-target';
import { benchAddress } from '../../../expected/bench-question';
import { foundStream } from '../../found-stream';
import { StreamHead } from '../../stream-head';
import { targetWords } from '../../words';
import { Calibration } from './calibration';
import { TargetForm } from './target-form';
import { TargetTable } from './target-table';

export const metadata: Metadata = { title: 'Target' };

export default async function TargetPage(props: {
  params: Promise<{ slug: string }>;
  searchParams: Promise<Record<string, string | string[]>>;
}) {
  const actor = await signedIn('see-line');
  const { stream, targets } = await foundStream(actor, props.params);
  const { kind, quantity } = stream;
  const { siteTimeZone } = readEnvironment();
  const now = new Date();
  const target = inForce(targets, now)?.target ?? null;
  const latestWafers = stream.chartedValue === 'relative' ? await listLatestWafers(actor, stream) : null;
  return (
    <>
      <StreamHead
        stream={stream}
        place="Target"
        answer={
          target === null
            ? `${stream.name} has no target, so nothing is expected of it`
            : `${stream.name} aims at ${targetWords(target)}`
        }
      />
      <SectionHead id="revisions">Revisions</SectionHead>
      <TargetTable slug={stream.slug} targets={targets} timeZone={siteTimeZone} />
      {target !== null && isImplantedOrDiffused(target) && (
        <Calibration
          actor={actor}
          stream={stream}
          target={target}
          latestWafers={latestWafers}
          asked={await props.searchParams}
          timeZone={siteTimeZone}
        />
      )}
      <SectionHead
        id="new"
        aside={
          target !== null && (
            <Link href={benchAddress({ kind, quantity, ...wordsOfTarget(target) })} prefetch={false}>
              the one in force on the bench
            </Link>
          )
        }
      >
        A new revision
      </SectionHead>
      <IfMay permission="revise-target" streamId={stream.id}>
        <TargetForm
          slug={stream.slug}
          kind={kind}
          quantity={quantity}
          wafers={latestWafers}
          target={target}
          now={siteTimeField(now, siteTimeZone)}
          timeZone={siteTimeZone}
        />
      </IfMay>
    </>
  );
}
