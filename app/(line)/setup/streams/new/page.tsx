import type { Metadata } from 'next';
import { ButtonLink } from '@/app/_ui/button-link';
import { EmptyState } from '@/app/_ui/empty-state';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';
import { listSitePlans } from '@/lib/streams/data';
import { NewStreamForm } from './form';

export const metadata: Metadata = { title: 'New stream' };

export default async function NewStreamPage() {
  const plans = await listSitePlans(await signedIn('create-stream'));
  return (
    <>
      <PageHead
        answer="Set up a stream"
        sub="What it is, how it is charted, what it aims at and what is accepted. Target, specification and limits go on in revisions; quantity, site plan and subgroup stay."
        back={{ href: '/setup', label: 'Setup' }}
      />
      {plans.length === 0 ? (
        <EmptyState what="A stream needs a site plan." how="Say first where the probe reads on its wafers.">
          <ButtonLink href="/setup/plans/new" weight="main">
            Draw up a site plan
          </ButtonLink>
        </EmptyState>
      ) : (
        <NewStreamForm plans={plans.map(({ id, name }) => ({ id, name }))} />
      )}
    </>
  );
}
