/** What a form shows after it was sent. */
export interface FormState {
  /** How often it was taken: its fields begin afresh each time. */
  taken: number;
  /** What is wrong, by the field's name. */
  errors: Readonly<Record<string, string>>;
  /** What is wrong with the whole. */
  message: string | null;
  /** What was done. */
  done: string | null;
}

export const UNSENT: FormState = { taken: 0, errors: {}, message: null, done: null };

/** The answer to a form that cannot be taken. The first fault of a field is the one shown beside it. */
export function refusedForm(
  before: FormState,
  faults: { errors?: readonly { field: string; reason: string }[]; message?: string },
): FormState {
  const errors: Record<string, string> = {};
  for (const { field, reason } of faults.errors ?? []) errors[field] ??= reason;
  const count = Object.keys(errors).length;
  const message =
    faults.message ?? (count === 1 ? 'One field needs another look.' : `${count} fields need another look.`);
  return { taken: before.taken, errors, message, done: null };
}

export function doneForm(before: FormState, done: string): FormState {
  return { taken: before.taken + 1, errors: {}, message: null, done };
}

/** The words a form sent, trimmed; files are passed over, a box that is not ticked is not there. */
export function formWords(form: FormData): Record<string, string> {
  const words: Record<string, string> = {};
  for (const [name, value] of form) if (typeof value === 'string') words[name] = value.trim();
  return words;
}

/** The faults that a schema found, by the field each belongs to. */
export function faultsOf(error: {
  issues: readonly { path: readonly PropertyKey[]; message: string }[];
}): { field: string; reason: string }[] {
  return error.issues.map(({ path, message }) => ({ field: String(path[0] ?? ''), reason: message }));
}
