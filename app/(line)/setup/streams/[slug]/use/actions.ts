'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { changeScreening } from '@/lib/limits/mutations';
import { findStreamSettings } from '@/lib/streams/data';
import { retireStream } from '@/lib/streams/mutations';
import { screeningChange } from '@/lib/streams/schema';

/** Changes how a stream's readings are screened from now on. */
export async function changeScreeningAction(
  slug: string,
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('change-rules');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, { message: 'There is no such stream.' });
  const change = screeningChange.safeParse(formWords(form));
  if (!change.success) return refusedForm(before, { errors: faultsOf(change.error) });
  const { screening, reason } = change.data;
  const changed = await changeScreening(actor, found.stream.id, screening, reason);
  if (!changed.ok) return refusedForm(before, { errors: [{ field: 'screening', reason: changed.reason }] });
  revalidatePath('/', 'layout');
  return doneForm(before, 'The screening is changed.');
}

/** Takes a stream out of use, or back into it. */
export async function retireStreamAction(
  slug: string,
  retired: boolean,
  before: FormState,
): Promise<FormState> {
  const asked = await actionActor('retire-stream');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, { message: 'There is no such stream.' });
  const done = await retireStream(actor, found.stream.id, retired === true);
  if (!done.ok) return refusedForm(before, { message: done.reason });
  revalidatePath('/', 'layout');
  return doneForm(before, retired ? 'It is out of use now.' : 'It is in use again.');
}
