'use client';

import { postToAccounts } from '@/app/accounts-request';
import { ActionForm } from '@/app/_ui/action-form';
import { Field } from '@/app/_ui/field';
import { type FormState, refusedForm } from '@/app/_ui/form-state';

/** A first password, or a new one for someone who forgot theirs. */
export function ChoosePasswordForm() {
  const choose = async (before: FormState, form: FormData) => {
    const token = window.location.hash.slice(1);
    if (token === '') return refusedForm(before, { message: 'The link is not whole: its end is missing.' });
    const newPassword = String(form.get('password'));
    const answer = await postToAccounts('/reset-password', { token, newPassword });
    if (!answer.ok) return refusedForm(before, { message: answer.reason });
    window.location.assign('/sign-in');
    return before;
  };
  return (
    <div style={{ maxWidth: 420 }}>
      <ActionForm action={choose} submit="Use this password" label="Choose a password">
        <Field
          name="password"
          label="Password"
          type="password"
          autoComplete="new-password"
          minLength={12}
          maxLength={128}
          required
          hint="At least 12 characters; several words do well."
        />
      </ActionForm>
    </div>
  );
}
