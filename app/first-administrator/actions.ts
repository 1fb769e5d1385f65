'use server';

import { redirect } from 'next/navigation';
import { faultsOf, type FormState, refusedForm } from '@/app/_ui/form-state';
import { createFirstAdministrator } from '@/lib/access/first-administrator';
import { isAskedAtMachine } from '@/lib/access/request-actor';
import { firstAdministrator } from '@/lib/access/schema';

/** Enters the first administrator, while there is none, for someone at the machine or with the code of its log. */
export async function enterFirstAdministrator(before: FormState, form: FormData): Promise<FormState> {
  const given = firstAdministrator.safeParse(Object.fromEntries(form));
  if (!given.success) return refusedForm(before, { errors: faultsOf(given.error) });
  const made = await createFirstAdministrator(given.data, await isAskedAtMachine());
  if (!made.ok) {
    const { field, reason } = made;
    return refusedForm(before, field === undefined ? { message: reason } : { errors: [{ field, reason }] });
  }
  redirect('/sign-in');
}
