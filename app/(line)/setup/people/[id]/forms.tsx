'use client';

import { ActionForm } from '@/app/_ui/action-form';
import type { Grant } from '@/lib/access/actor';
import type { StreamChoice } from '../../stream-boxes';
import { RoleFields } from '../role-fields';
import { changeRolesAction, deactivatePersonAction, endSessionsAction, invitePersonAction } from './actions';

/** The roles of a person, to change. */
export function RolesForm(props: { id: string; grants: readonly Grant[]; streams: readonly StreamChoice[] }) {
  return (
    <ActionForm
      action={changeRolesAction.bind(null, props.id)}
      submit="Change the roles"
      label="Change the roles"
    >
      {({ errors }) => <RoleFields grants={props.grants} streams={props.streams} errors={errors} />}
    </ActionForm>
  );
}

/** A link by which a person chooses a password, for the first time or because they forgot theirs. */
export function LinkForm({ id }: { id: string }) {
  return (
    <ActionForm
      action={invitePersonAction.bind(null, id)}
      submit="Make a link"
      label="Link to choose a password"
      weight="plain"
    >
      <p className="quiet">
        Whoever opens the link chooses the password of this person, and sessions that go on end. A link made
        before no longer works.
      </p>
    </ActionForm>
  );
}

/** Ends every session of a person. */
export function SessionsForm({ id }: { id: string }) {
  return (
    <ActionForm
      action={endSessionsAction.bind(null, id)}
      submit="Sign them out everywhere"
      label="Sessions"
      weight="plain"
    />
  );
}

/** Deactivates a person, or takes that back. */
export function DeactivateForm({ id, deactivated }: { id: string; deactivated: boolean }) {
  return (
    <ActionForm
      action={deactivatePersonAction.bind(null, id, !deactivated)}
      submit={deactivated ? 'Let them sign in again' : 'Deactivate'}
      label={deactivated ? 'Reactivate' : 'Deactivate'}
      weight="plain"
    >
      <p className="quiet">
        {deactivated
          ? 'Their roles are as they were.'
          : 'Their sessions end and they cannot sign in. What they did keeps their name, and they can come back.'}
      </p>
    </ActionForm>
  );
}
