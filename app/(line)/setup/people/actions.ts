'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { LINK_DAYS } from '@/lib/access/password-link';
import { addPerson } from '@/lib/access/people';
import { requestedOrigin } from '@/lib/access/request-actor';
import { grantsGiven, newPerson } from '@/lib/access/schema';

/** Enters a person and shows their link. */
export async function addPersonAction(before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('manage-people');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const person = newPerson.safeParse(formWords(form));
  if (!person.success) return refusedForm(before, { errors: faultsOf(person.error) });
  const given = grantsGiven(form);
  if ('reason' in given) return refusedForm(before, { errors: [given] });
  const added = await addPerson(asked.actor, { ...person.data, ...given });
  if (!added.ok) return refusedForm(before, { errors: [{ field: 'email', reason: added.reason }] });
  revalidatePath('/setup', 'layout');
  return doneForm(
    before,
    `${person.data.name} is entered. Hand over this link, which is shown only now and works once, within ${LINK_DAYS} days: ` +
      `${await requestedOrigin()}/choose-password#${added.value.code}`,
  );
}
