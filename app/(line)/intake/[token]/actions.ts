'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { formWords, refusedForm, type FormState } from '@/app/_ui/form-state';
import { actionActor } from '@/app/action-actor';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { intakeFile } from '@/lib/maps/mutations';
import { givenWords } from '@/lib/maps/schema';
import { claimWaitingFile, dropWaitingFile, releaseWaitingFile } from '@/lib/maps/waiting-file';

/** Records a file that was checked and goes to what became of it. */
export async function recordFile(
  file: { token: string; query: string; faulty: number },
  before: FormState,
  form: FormData,
): Promise<FormState> {
  const asked = await actionActor('record-maps');
  if (!asked.ok) return refusedForm(before, { message: asked.reason });
  const { actor } = asked;
  const words = formWords(form);
  const sound = words['sound'] !== undefined;
  if (file.faulty > 0 && !sound && words['refusal'] === undefined) {
    const reason = 'This file has problems: tick this box to record the rest of it.';
    return refusedForm(before, { errors: [{ field: 'sound', reason }] });
  }
  const query = Object.fromEntries(new URLSearchParams(String(file.query)));
  const given = givenWords(query, readEnvironment().siteTimeZone);
  const claimed = await claimWaitingFile(actor, String(file.token));
  if (claimed === null) {
    return refusedForm(before, {
      message: 'This file is being recorded, or was recorded or discarded: see Intake for its batch.',
    });
  }
  const options = { origin: 'page', history: words['history'] !== undefined, sound } as const;
  const result = await intakeFile(actor, claimed, { ...options, defaults: given.words }).catch(
    async (error: unknown) => {
      await releaseWaitingFile(actor, claimed.token);
      throw error;
    },
  );
  await dropWaitingFile(actor, claimed.token);
  revalidatePath('/', 'layout');
  redirect(result.batchId === null ? '/intake' : `/intake/batches/${result.batchId}`);
}

/** Throws a waiting file away, unrecorded; one that is being recorded meanwhile is left to that. */
export async function discardFile(token: string): Promise<void> {
  const actor = await signedIn('record-maps');
  const claimed = await claimWaitingFile(actor, String(token));
  if (claimed !== null) await dropWaitingFile(actor, claimed.token);
  redirect('/intake');
}
