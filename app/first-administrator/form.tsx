'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Field } from '@/app/_ui/field';
import { enterFirstAdministrator } from './actions';

/** Name, address and password of the first administrator; from elsewhere also the code of the server's log. */
export function FirstAdministratorForm({ needsCode }: { needsCode: boolean }) {
  return (
    <div style={{ maxWidth: 420 }}>
      <ActionForm action={enterFirstAdministrator} submit="Enter" label="First administrator">
        {({ errors }) => (
          <>
            <Field
              name="name"
              label="Name"
              autoComplete="name"
              maxLength={80}
              required
              error={errors['name'] ?? null}
            />
            <Field
              name="email"
              label="E-mail address"
              type="email"
              autoComplete="username"
              required
              error={errors['email'] ?? null}
            />
            <Field
              name="password"
              label="Password"
              type="password"
              autoComplete="new-password"
              minLength={12}
              maxLength={128}
              required
              hint="At least 12 characters; several words do well."
              error={errors['password'] ?? null}
            />
            {needsCode && (
              <Field
                name="code"
                label="Code from the server's log"
                autoComplete="off"
                required
                hint="The server printed it when it started: this page was not opened on its own machine."
                error={errors['code'] ?? null}
              />
            )}
          </>
        )}
      </ActionForm>
    </div>
  );
}
