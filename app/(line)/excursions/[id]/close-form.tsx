'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Field, TextField } from '@/app/_ui/field';
import type { FormState } from '@/app/_ui/form-state';

/** Closes an excursion with its cause. It cannot be opened again: what goes on opens a new one. */
export function CloseForm(props: { action: (state: FormState, form: FormData) => Promise<FormState> }) {
  return (
    <ActionForm
      action={props.action}
      label="Close this excursion"
      submit="Close the excursion"
      weight="plain"
    >
      {(sent) => (
        <>
          <input type="hidden" name="to" value="closed" />
          <Field
            name="cause"
            id="close-cause"
            label="Cause"
            hint="As found, or that none was found."
            maxLength={500}
            error={sent.errors.cause ?? null}
          />
          <TextField
            name="note"
            id="close-note"
            label="What was done"
            maxLength={2000}
            error={sent.errors.note ?? null}
          />
          <p className="quiet small">
            A closed excursion stays closed: should the signal go on, it opens a new one.
          </p>
        </>
      )}
    </ActionForm>
  );
}
