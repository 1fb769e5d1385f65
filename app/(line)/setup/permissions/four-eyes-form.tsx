'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { setFourEyesAction } from './actions';

/** Whether whoever drew limits up may approve them. */
export function FourEyesForm({ on }: { on: boolean }) {
  return (
    <ActionForm
      action={setFourEyesAction.bind(null, !on)}
      submit={on ? 'Let one person do both' : 'Ask for four eyes'}
      label="Four eyes over limits"
      weight="plain"
    >
      <p className="quiet">
        {on
          ? 'Limits that a person drew up are approved by someone else.'
          : 'Whoever draws limits up may approve them too.'}
      </p>
    </ActionForm>
  );
}
