import type { Metadata } from 'next';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';
import { NewPlanForm } from './form';

export const metadata: Metadata = { title: 'New site plan' };

export default async function NewPlanPage() {
  await signedIn('create-stream');
  return (
    <>
      <PageHead
        answer="Draw up a site plan"
        sub="Where the probe reads, on wafers of which size. A plan is never changed once it is there: other sites are another plan."
        back={{ href: '/setup', label: 'Setup' }}
      />
      <NewPlanForm />
    </>
  );
}
