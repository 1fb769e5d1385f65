'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, type FormState, formWords, refusedForm } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { stepExcursion } from '@/lib/excursions/mutations';
import { excursionId, excursionStep } from '@/lib/excursions/schema';

const DONE = {
  acknowledged: 'Acknowledged.',
  'under-investigation': 'Under investigation.',
  noted: 'The note is in the log.',
  closed: 'Closed.',
} as const;

/** Takes an excursion a step further: acknowledge, investigate, note, or close with its cause. */
export async function takeStep(id: string, before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('comment-case');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const excursion = excursionId.safeParse(id);
  const step = excursionStep.safeParse(formWords(form));
  if (!excursion.success) return refusedForm(before, { message: 'There is no such excursion.' });
  if (!step.success) {
    const errors = step.error.issues.map(({ path, message }) => ({
      field: String(path[0] ?? ''),
      reason: message,
    }));
    const known = errors.filter(({ field }) => field === 'note' || field === 'cause');
    return refusedForm(before, known.length > 0 ? { errors: known } : { message: 'This step is not known.' });
  }
  const result = await stepExcursion(actor, excursion.data, step.data);
  // After a refusal the page stays as it is: a form that vanished would take what was typed with it.
  if (!result.ok) {
    return refusedForm(before, {
      message: `${result.reason} Load the page again to see what was done meanwhile.`,
    });
  }
  revalidatePath(`/excursions/${excursion.data}`);
  return doneForm(before, DONE[step.data.to]);
}
