'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { readEnvironment } from '@/lib/env';
import { findStreamSettings } from '@/lib/streams/data';
import { reviseTarget } from '@/lib/streams/mutations';
import { targetMeta } from '@/lib/streams/schema';
import { typedTarget } from '@/lib/streams/typed-target';
import { typedNumberOrNone } from '@/lib/typed';

const wafers = typedNumberOrNone({ wish: 'a number of wafers', holds: (v) => Number.isInteger(v) && v > 0 });

/** Records a new revision of a stream's target. */
export async function reviseTargetAction(
  slug: string,
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('revise-target');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const words = formWords(form);
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, { message: 'There is no such stream.' });
  const target = typedTarget(found.stream.quantity).safeParse(words);
  const meta = targetMeta(readEnvironment().siteTimeZone).safeParse(words);
  if (!target.success || !meta.success) {
    const errors = [target, meta].flatMap((part) => (part.success ? [] : faultsOf(part.error)));
    return refusedForm(before, { errors });
  }
  const calibrationWafers = wafers.catch(null).parse(words['calibrationWafers']);
  const made = await reviseTarget(actor, found.stream.id, target.data, { ...meta.data, calibrationWafers });
  if (!made.ok) return refusedForm(before, { errors: [{ field: 'effectiveFrom', reason: made.reason }] });
  revalidatePath('/', 'layout');
  const restart = meta.data.restart ? ' The rules begin afresh where it takes force.' : '';
  return doneForm(before, `Target revision ${made.value} is recorded.${restart}`);
}
