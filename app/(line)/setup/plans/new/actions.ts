'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { createSitePlan } from '@/lib/streams/mutations';
import { newSitePlan } from '@/lib/streams/planned-sites';

/** Keeps a new site plan. */
export async function createPlanAction(before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('create-stream');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const plan = newSitePlan.safeParse(formWords(form));
  if (!plan.success) return refusedForm(before, { errors: faultsOf(plan.error) });
  const made = await createSitePlan(actor, plan.data);
  if (!made.ok) return refusedForm(before, { errors: [{ field: 'name', reason: made.reason }] });
  revalidatePath('/setup', 'layout');
  redirect('/setup#plans');
}
