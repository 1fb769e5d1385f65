'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Caution } from '@/app/_ui/caution';
import { CheckField } from '@/app/_ui/check-field';
import { Field, SelectField } from '@/app/_ui/field';
import { Options } from '../../../options';
import { recordEventAction } from './actions';

const KINDS = { adjustment: 'adjustment', maintenance: 'maintenance' };

/** What was done to a stream's tool, and whether its charts begin afresh. */
export function EventForm({ slug, now, timeZone }: { slug: string; now: string; timeZone: string }) {
  return (
    <ActionForm
      action={recordEventAction.bind(null, slug)}
      label="Record an event"
      submit="Record this event"
      working="Recording it…"
    >
      {({ errors }) => (
        <>
          <div className="columns">
            <SelectField name="kind" label="What" defaultValue="adjustment" error={errors['kind'] ?? null}>
              <Options words={KINDS} order={['adjustment', 'maintenance']} />
            </SelectField>
            <Field
              name="at"
              type="datetime-local"
              label="When"
              hint={`Clock time in ${timeZone}`}
              defaultValue={now}
              error={errors['at'] ?? null}
            />
          </div>
          <Field
            name="text"
            label="In words"
            hint="Such as “dose factor 0.985 to 1.000” or “chamber cleaned, new liner”"
            autoComplete="off"
            error={errors['text'] ?? null}
          />
          <CheckField
            name="restart"
            label="The charts begin afresh after it"
            hint="No rule then looks across it, and what lies after it is judged again. For what may move the level on purpose."
          />
          <Caution />
        </>
      )}
    </ActionForm>
  );
}
