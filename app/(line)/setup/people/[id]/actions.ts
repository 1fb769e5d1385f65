'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import type { Actor } from '@/lib/access/actor';
import { LINK_DAYS } from '@/lib/access/password-link';
import { changeRoles, deactivatePerson, endSessions, invitePerson } from '@/lib/access/people';
import { requestedOrigin } from '@/lib/access/request-actor';
import { grantsGiven } from '@/lib/access/schema';
import type { AccessResult } from '@/lib/access/types';

async function changed<Value>(
  before: FormState,
  change: (actor: Actor) => Promise<AccessResult<Value>>,
  done: (value: Value) => string | Promise<string>,
): Promise<FormState> {
  const asked = await actionActor('manage-people');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const answer = await change(asked.actor);
  if (!answer.ok) return refusedForm(before, { message: answer.reason });
  revalidatePath('/setup', 'layout');
  return doneForm(before, await done(answer.value));
}

export async function changeRolesAction(id: string, before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('manage-people');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const given = grantsGiven(form);
  if ('reason' in given) return refusedForm(before, { errors: [given] });
  return changed(
    before,
    (actor) => changeRoles(actor, String(id), given.grants),
    () => 'The roles are changed; they hold from the next page on.',
  );
}

export async function invitePersonAction(id: string, before: FormState): Promise<FormState> {
  return changed(
    before,
    (actor) => invitePerson(actor, String(id)),
    async (code) =>
      `Hand over this link, which is shown only now and works once, within ${LINK_DAYS} days: ` +
      `${await requestedOrigin()}/choose-password#${code}`,
  );
}

export async function endSessionsAction(id: string, before: FormState): Promise<FormState> {
  return changed(
    before,
    (actor) => endSessions(actor, String(id)),
    () => 'They are signed out everywhere.',
  );
}

export async function deactivatePersonAction(
  id: string,
  deactivated: boolean,
  before: FormState,
): Promise<FormState> {
  return changed(
    before,
    (actor) => deactivatePerson(actor, String(id), deactivated === true),
    () => (deactivated ? 'They may no longer sign in.' : 'They may sign in again.'),
  );
}
