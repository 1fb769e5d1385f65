'use client';

import { postToAccounts } from '@/app/accounts-request';
import { ActionForm } from '@/app/_ui/action-form';
import { Field } from '@/app/_ui/field';
import { type FormState, formWords, refusedForm } from '@/app/_ui/form-state';

/** Sign-in by e-mail address and password; the whole page is loaded afresh for whoever signed in. */
export function SignInForm({ next }: { next: string }) {
  const signIn = async (before: FormState, form: FormData) => {
    const { email = '' } = formWords(form);
    const answer = await postToAccounts('/sign-in/email', { email, password: String(form.get('password')) });
    if (!answer.ok) return refusedForm(before, { message: answer.reason });
    window.location.assign(next);
    return before;
  };
  return (
    <ActionForm action={signIn} submit="Sign in" working="Signing in…" label="Sign in">
      <Field name="email" label="E-mail address" type="email" autoComplete="username" required />
      <Field
        name="password"
        label="Password"
        type="password"
        autoComplete="current-password"
        maxLength={128}
        required
      />
    </ActionForm>
  );
}
