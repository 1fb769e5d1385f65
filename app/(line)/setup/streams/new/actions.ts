'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { faultsOf, formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { createStream } from '@/lib/streams/mutations';
import { newStream, typedSpecification } from '@/lib/streams/schema';
import { slugOf } from '@/lib/streams/slug-of';
import { typedTarget } from '@/lib/streams/typed-target';

/** Sets up a stream with its first target and specification, and goes to its page. */
export async function createStreamAction(before: FormState, form: FormData): Promise<FormState> {
  const asked = await actionActor('create-stream');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const sent = formWords(form);
  const words: Record<string, string> = { ...sent, slug: sent['slug'] || slugOf(sent['name'] ?? '') };
  const stream = newStream.safeParse(words);
  const quantity = words['quantity'] === 'sheet_resistance' ? 'sheet_resistance' : 'resistivity';
  const target = typedTarget(quantity).safeParse(words);
  const specification = typedSpecification.safeParse(words);
  if (!stream.success || !target.success || !specification.success) {
    const parts = [stream, target, specification];
    const errors = parts.flatMap((part) => (part.success ? [] : faultsOf(part.error)));
    return refusedForm(before, { errors });
  }
  const made = await createStream(actor, stream.data, target.data, specification.data);
  if (!made.ok) return refusedForm(before, { errors: [{ field: 'slug', reason: made.reason }] });
  revalidatePath('/', 'layout');
  redirect(`/setup/streams/${stream.data.slug}`);
}
