'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { readEnvironment } from '@/lib/env';
import { approveLimits, discardLimits, draftLimits, enterInheritedLimits } from '@/lib/limits/mutations';
import { baselineSpan, inheritedLimits, limitApproval, limitDraft } from '@/lib/limits/schema';
import { findStreamSettings } from '@/lib/streams/data';

const NO_STREAM = { message: 'There is no such stream.' };
const zone = () => readEnvironment().siteTimeZone;

/** Drafts the limits that a span of subgroups sets. */
export async function draftLimitsAction(
  slug: string,
  span: { from: string; to: string },
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('draft-limits');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, NO_STREAM);
  const parsed = baselineSpan(zone()).safeParse(span);
  if (!parsed.success) return refusedForm(before, { message: 'That span is none: choose it again.' });
  const draft = limitDraft.safeParse(formWords(form));
  if (!draft.success) return refusedForm(before, { errors: faultsOf(draft.error) });
  const made = await draftLimits(actor, found.stream.id, parsed.data, draft.data.reason);
  if (!made.ok) return refusedForm(before, { message: made.reason });
  revalidatePath('/setup', 'layout');
  return doneForm(
    before,
    'The draft is made: it stands at the top of this page, to be approved or set aside.',
  );
}

/** Enters limits from elsewhere as a draft. */
export async function enterInheritedAction(
  slug: string,
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('draft-limits');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, NO_STREAM);
  const { id, subgroupSize } = found.stream;
  const given = inheritedLimits(zone(), subgroupSize).safeParse(formWords(form));
  if (!given.success) return refusedForm(before, { errors: faultsOf(given.error) });
  const { limits, effectiveFrom, reason } = given.data;
  const made = await enterInheritedLimits(actor, id, limits, effectiveFrom, reason);
  if (!made.ok) return refusedForm(before, { message: made.reason });
  revalidatePath('/setup', 'layout');
  return doneForm(before, 'They are entered: approve them at the top of this page, and they judge.');
}

/** Approves a draft or the provisional limits. */
export async function approveLimitsAction(
  slug: string,
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('approve-limits');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  if ((await findStreamSettings(actor, String(slug))) === null) return refusedForm(before, NO_STREAM);
  const approval = limitApproval(zone()).safeParse(formWords(form));
  if (!approval.success) return refusedForm(before, { errors: faultsOf(approval.error) });
  const { revisionId, reason, effectiveFrom } = approval.data;
  const approved = await approveLimits(actor, revisionId, { reason, effectiveFrom });
  if (!approved.ok) return refusedForm(before, { message: approved.reason });
  revalidatePath('/', 'layout');
  return doneForm(before, 'They are approved.');
}

/** Sets a draft aside; it stays on record. */
export async function discardLimitsAction(revisionId: string, before: FormState): Promise<FormState> {
  const asked = await actionActor('draft-limits');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  if (!/^\d{1,18}$/.test(String(revisionId))) {
    return refusedForm(before, { message: 'There is no such revision.' });
  }
  const discarded = await discardLimits(asked.actor, String(revisionId));
  if (!discarded.ok) return refusedForm(before, { message: discarded.reason });
  revalidatePath('/setup', 'layout');
  return doneForm(before, 'It is set aside.');
}
