'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Field } from '@/app/_ui/field';
import type { StreamChoice } from '../stream-boxes';
import { addPersonAction } from './actions';
import { RoleFields } from './role-fields';

/** Enters a person; the answer shows the link by which they choose a password. */
export function AddForm({ streams }: { streams: readonly StreamChoice[] }) {
  return (
    <ActionForm action={addPersonAction} submit="Add this person" label="Add a person">
      {({ errors }) => (
        <>
          <div className="columns">
            <Field
              name="name"
              label="Name"
              autoComplete="off"
              maxLength={80}
              error={errors['name'] ?? null}
            />
            <Field
              name="email"
              label="E-mail address"
              type="email"
              autoComplete="off"
              hint="Nothing is sent there: it is what they sign in with"
              error={errors['email'] ?? null}
            />
          </div>
          <RoleFields grants={[]} streams={streams} errors={errors} />
        </>
      )}
    </ActionForm>
  );
}
