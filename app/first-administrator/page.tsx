import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PageHead } from '@/app/_ui/page-head';
import { isFirstAdministratorDue } from '@/lib/access/first-administrator';
import { isAskedAtMachine } from '@/lib/access/request-actor';
import { FirstAdministratorForm } from './form';

export const metadata: Metadata = { title: 'First administrator' };

/** Once: after that there is nothing at this address. */
export default async function FirstAdministratorPage() {
  if (!(await isFirstAdministratorDue())) notFound();
  const isAtMachine = await isAskedAtMachine();
  return (
    <>
      <PageHead
        answer="Enter the first administrator"
        sub="Nobody has an account on this server yet. The administrator signs in, adds everybody else and gives the roles, to themselves too; this page then goes away."
      />
      <FirstAdministratorForm needsCode={!isAtMachine} />
    </>
  );
}
