'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { newToken, streamsChosen } from '@/lib/access/schema';
import { makeToken, revokeToken } from '@/lib/access/tokens';

/** Makes a token and shows it, the only time. */
export async function makeTokenAction(before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('manage-tokens');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const wish = newToken.safeParse(formWords(form));
  if (!wish.success) return refusedForm(before, { errors: faultsOf(wish.error) });
  const { reach, ...fields } = wish.data;
  const chosen = streamsChosen(form, 'token');
  const isOfChosen = fields.scope === 'intake' && reach === 'chosen';
  if (isOfChosen && chosen.length === 0) {
    return refusedForm(before, { errors: [{ field: 'reach', reason: 'Choose at least one stream.' }] });
  }
  const made = await makeToken(asked.actor, { ...fields, streamIds: isOfChosen ? chosen : null });
  if (!made.ok) return refusedForm(before, { message: made.reason });
  revalidatePath('/setup/tokens');
  return doneForm(before, `The token of ${fields.name}, which is shown only now: ${made.value}`);
}

/** Revokes a token. */
export async function revokeTokenAction(id: string, before: FormState): Promise<FormState> {
  const asked = await actionActor('manage-tokens');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  if (!/^\d{1,18}$/.test(String(id))) return refusedForm(before, { message: 'There is no such token.' });
  const revoked = await revokeToken(asked.actor, String(id));
  if (!revoked.ok) return refusedForm(before, { message: revoked.reason });
  revalidatePath('/setup/tokens');
  return doneForm(before, 'It is revoked.');
}
