'use server';

import { revalidatePath } from 'next/cache';
import { doneForm, faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { readEnvironment } from '@/lib/env';
import { findStreamSettings } from '@/lib/streams/data';
import { reviseSpecification } from '@/lib/streams/mutations';
import { revisionMeta, typedSpecification } from '@/lib/streams/schema';
import type { Specification } from '@/lib/streams/types';

const NOTHING: Specification = {
  meanLower: null,
  meanUpper: null,
  siteLower: null,
  siteUpper: null,
  nonuniformityMetric: null,
  nonuniformityUpper: null,
};

/** Records a new revision of a stream's specification; with every field empty nothing is specified any more. */
export async function reviseSpecificationAction(
  slug: string,
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('revise-specification');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const words = formWords(form);
  const found = await findStreamSettings(actor, String(slug));
  if (found === null) return refusedForm(before, { message: 'There is no such stream.' });
  const specification = typedSpecification.safeParse(words);
  const meta = revisionMeta(readEnvironment().siteTimeZone).safeParse(words);
  if (!specification.success || !meta.success) {
    const errors = [specification, meta].flatMap((part) => (part.success ? [] : faultsOf(part.error)));
    return refusedForm(before, { errors });
  }
  const made = await reviseSpecification(actor, found.stream.id, specification.data ?? NOTHING, meta.data);
  if (!made.ok) return refusedForm(before, { errors: [{ field: 'effectiveFrom', reason: made.reason }] });
  revalidatePath('/', 'layout');
  return doneForm(before, `Specification revision ${made.value} is recorded.`);
}
