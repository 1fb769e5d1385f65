'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { findWafer } from '@/lib/maps/data';
import { decideReading } from '@/lib/maps/mutations';
import { readingDecision } from '@/lib/maps/schema';

/** Takes one reading of a wafer out of its figures, or puts it back. */
export async function decide(waferId: string, before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('exclude-reading');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const parsed = readingDecision.safeParse(formWords(form));
  if (!parsed.success) {
    const errors = parsed.error.issues.map(({ path, message }) => ({
      field: String(path[0]),
      reason: message,
    }));
    return refusedForm(before, { errors });
  }
  const { site, reason } = parsed.data;
  const found = await findWafer(actor, String(waferId));
  if (found === null) return refusedForm(before, { message: 'This wafer is not on record.' });
  const result = await decideReading(actor, found.wafer.streamId, found.wafer.id, { ...site, reason });
  if (!result.ok) return refusedForm(before, { errors: [{ field: 'site', reason: result.reason }] });
  revalidatePath('/', 'layout');
  const words = site.action === 'out' ? 'taken out' : 'put back';
  return doneForm(
    before,
    `Site ${site.siteIndex + 1} was ${words}; the wafer was measured and judged again.`,
  );
}
