'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { readEnvironment } from '@/lib/env';
import { findStreamSettings } from '@/lib/streams/data';
import { recordStreamEvent } from '@/lib/streams/mutations';
import { newStreamEvent } from '@/lib/streams/schema';

/** Records an adjustment or maintenance of a stream's tool. */
export async function recordEventAction(slug: string, before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('record-event');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, { message: 'There is no such stream.' });
  const event = newStreamEvent(readEnvironment().siteTimeZone).safeParse(formWords(form));
  if (!event.success) return refusedForm(before, { errors: faultsOf(event.error) });
  const recorded = await recordStreamEvent(actor, found.stream.id, event.data);
  if (!recorded.ok) return refusedForm(before, { message: recorded.reason });
  revalidatePath('/', 'layout');
  return doneForm(before, `The ${event.data.kind} is recorded.`);
}
