'use client';

import { useActionState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';
import { UNSENT } from '@/app/_ui/form-state';
import { Notice } from '@/app/_ui/notice';
import { approveLimitsAction, discardLimitsAction } from './actions';

/** Someone's word on limits: approved with a reason and from when, or, where they judge nothing yet, set aside. */
export function ApproveForm(props: {
  slug: string;
  revisionId: string;
  revision: number;
  isDraft: boolean;
  now: string;
  timeZone: string;
}) {
  const { slug, revisionId, revision, isDraft } = props;
  const aside = `set-aside-${revisionId}`;
  const [setAside, discard] = useActionState(discardLimitsAction.bind(null, revisionId), UNSENT);
  return (
    <>
      {isDraft && <form id={aside} action={discard} aria-label={`Set revision ${revision} aside`} />}
      {setAside.message !== null && <Notice kind="call">{setAside.message}</Notice>}
      <ActionForm
        action={approveLimitsAction.bind(null, slug)}
        label={`Approve revision ${revision}`}
        submit={`Approve revision ${revision}`}
        working="Approving, and judging again…"
        aside={
          isDraft && (
            <Button type="submit" form={aside}>
              Set it aside
            </Button>
          )
        }
      >
        {({ errors }) => (
          <>
            <input type="hidden" name="revisionId" value={revisionId} />
            {!isDraft && <input type="hidden" name="effectiveFrom" value={props.now} />}
            <div className="columns">
              <Field
                id={`reason-${revisionId}`}
                name="reason"
                label="Why these limits are right"
                hint="Approved limits are never edited; this stays with them"
                autoComplete="off"
                error={errors['reason'] ?? null}
              />
              {isDraft && (
                <Field
                  id={`from-${revisionId}`}
                  name="effectiveFrom"
                  type="datetime-local"
                  label="In force for subgroups after"
                  hint={`Clock time in ${props.timeZone}. What lies later is judged again, up to a later approved revision or change of the screening`}
                  defaultValue={props.now}
                  error={errors['effectiveFrom'] ?? null}
                />
              )}
            </div>
          </>
        )}
      </ActionForm>
    </>
  );
}
