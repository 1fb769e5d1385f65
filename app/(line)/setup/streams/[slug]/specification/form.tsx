'use client';

import { ActionForm } from '@/app/_ui/action-form';
import type { Specification, Stream } from '@/lib/streams/types';
import { RevisionFields } from '../../../revision-fields';
import { SpecificationFields } from '../../../specification-fields';
import { reviseSpecificationAction } from './actions';

/** A new revision of a specification, begun from the one in force. */
export function SpecificationForm(props: {
  slug: string;
  quantity: Stream['quantity'];
  specification: Specification | null;
  now: string;
  timeZone: string;
}) {
  return (
    <ActionForm
      action={reviseSpecificationAction.bind(null, props.slug)}
      label="New specification revision"
      submit="Record this revision"
      working="Recording it…"
    >
      {({ errors }) => (
        <>
          <SpecificationFields
            specification={props.specification}
            quantity={props.quantity}
            errors={errors}
          />
          <RevisionFields
            now={props.now}
            timeZone={props.timeZone}
            errors={errors}
            hint="For wafers processed from then on, and after those on record: these stay as they were judged."
          />
        </>
      )}
    </ActionForm>
  );
}
