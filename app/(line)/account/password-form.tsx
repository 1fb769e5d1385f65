'use client';

import { postToAccounts } from '@/app/accounts-request';
import { ActionForm } from '@/app/_ui/action-form';
import { Field } from '@/app/_ui/field';
import { doneForm, type FormState, refusedForm } from '@/app/_ui/form-state';

/** A new password in place of the one in use. */
export function PasswordForm() {
  const change = async (before: FormState, form: FormData) => {
    const answer = await postToAccounts('/change-password', {
      currentPassword: String(form.get('current')),
      newPassword: String(form.get('new')),
      revokeOtherSessions: true,
    });
    if (!answer.ok) return refusedForm(before, { message: answer.reason });
    return doneForm(
      before,
      'The new password is in use; wherever else you were signed in, you no longer are.',
    );
  };
  return (
    <div style={{ maxWidth: 420 }}>
      <ActionForm action={change} submit="Change the password" label="Password" weight="plain">
        <Field
          name="current"
          label="Password in use"
          type="password"
          autoComplete="current-password"
          maxLength={128}
          required
        />
        <Field
          name="new"
          label="New password"
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
