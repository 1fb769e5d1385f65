'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { setFourEyes } from '@/lib/access/four-eyes';

/** Asks for four eyes over limits, or no longer. */
export async function setFourEyesAction(on: boolean, before: FormState): Promise<FormState> {
  const asked = await actionActor('change-settings');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const changed = await setFourEyes(asked.actor, on === true);
  if (!changed.ok) return refusedForm(before, { message: changed.reason });
  revalidatePath('/setup', 'layout');
  return doneForm(before, on ? 'Limits need four eyes now.' : 'Limits no longer need four eyes.');
}
