import type { Metadata } from 'next';
import { ButtonLink } from '@/app/_ui/button-link';
import { EmptyState } from '@/app/_ui/empty-state';
import { PageHead } from '@/app/_ui/page-head';
import { SectionHead } from '@/app/_ui/section-head';
import { IfMay } from '@/app/if-may';
import { signedIn } from '@/app/page-actor';
import { may } from '@/lib/access/actor';
import { listLimitsInForce } from '@/lib/limits/data';
import { listSitePlans, listStreams, listStreamSettings } from '@/lib/streams/data';
import { AccessLinks } from './access-links';
import { firstStep } from './first-step';
import { PlanTable } from './plan-table';
import { setupRows } from './setup-rows';
import { StreamTable } from './stream-table';

export const metadata: Metadata = { title: 'Setup' };

export default async function SetupPage() {
  const actor = await signedIn('see-line');
  const [streams, plans, limits] = await Promise.all([
    listStreams(actor, { retired: true }),
    listSitePlans(actor),
    listLimitsInForce(actor),
  ]);
  const settings = await listStreamSettings(
    actor,
    streams.map((stream) => stream.id),
  );
  const rows = setupRows(settings, limits, new Date());
  const inUse = rows.filter((row) => !row.retired).length;
  const one = (count: number, word: string) => `${count} ${word}${count === 1 ? '' : 's'}`;
  return (
    <>
      <PageHead
        answer={
          rows.length === 0
            ? 'No stream is set up yet'
            : `${one(inUse, 'stream')} in use, on ${one(plans.length, 'site plan')}`
        }
        sub="A stream is one step, tool, chamber, recipe, target and site plan: what one control chart is about."
      />
      <IfMay permission="create-stream">
        <p style={{ display: 'flex', flexWrap: 'wrap', gap: 12 }}>
          <ButtonLink href="/setup/streams/new" weight={plans.length > 0 ? 'main' : 'plain'}>
            Set up a stream
          </ButtonLink>
          <ButtonLink href="/setup/plans/new" weight={plans.length > 0 ? 'plain' : 'main'}>
            Draw up a site plan
          </ButtonLink>
        </p>
      </IfMay>
      {rows.length === 0 ? (
        <EmptyState
          what="Each stream will stand here with its target, its specification and the limits that judge it."
          how={firstStep(may(actor, 'create-stream'), plans.length)}
        />
      ) : (
        <>
          <SectionHead id="streams">Streams</SectionHead>
          <StreamTable rows={rows} />
        </>
      )}
      <SectionHead id="plans">Site plans</SectionHead>
      <PlanTable plans={plans} />
      <AccessLinks actor={actor} />
    </>
  );
}
