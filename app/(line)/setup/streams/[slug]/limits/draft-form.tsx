'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Field } from '@/app/_ui/field';
import { draftLimitsAction } from './actions';

/** Makes a draft of the limits that a span would set. */
export function DraftForm({ slug, span }: { slug: string; span: { from: string; to: string } }) {
  return (
    <ActionForm
      action={draftLimitsAction.bind(null, slug, span)}
      label="Draft these limits"
      submit="Draft these limits"
      working="Drafting…"
      weight="plain"
    >
      {({ errors }) => (
        <Field
          id="draft-reason"
          name="reason"
          label="Why this span"
          hint="A draft judges nothing until it is approved"
          autoComplete="off"
          error={errors['reason'] ?? null}
        />
      )}
    </ActionForm>
  );
}
