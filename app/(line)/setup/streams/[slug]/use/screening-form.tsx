'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Field, SelectField } from '@/app/_ui/field';
import { SCREENS } from '@/lib/streams/schema';
import type { Stream } from '@/lib/streams/types';
import { Options } from '../../../options';
import { SCREEN_WORDS } from '../../../words';
import { changeScreeningAction } from './actions';

/** A change of how readings are screened, which begins a new revision of the limits. */
export function ScreeningForm({ slug, screening }: { slug: string; screening: Stream['screening'] }) {
  return (
    <ActionForm
      action={changeScreeningAction.bind(null, slug)}
      label="Change the screening"
      submit="Change the screening"
      working="Measuring the baseline again…"
      weight="plain"
    >
      {({ errors }) => (
        <>
          <p className="quiet">
            It holds for wafers processed from now on; those on record, and those processed before but
            recorded later, are screened as until now. The baseline of the limits in force is measured again
            and a provisional revision begins at the same instant.
          </p>
          <div className="columns">
            <SelectField
              name="screening"
              label="From now on"
              defaultValue={screening}
              error={errors['screening'] ?? null}
            >
              <Options words={SCREEN_WORDS} order={SCREENS} />
            </SelectField>
            <Field
              name="reason"
              label="Why"
              hint="Stays with the change and the new limits"
              autoComplete="off"
              error={errors['reason'] ?? null}
            />
          </div>
        </>
      )}
    </ActionForm>
  );
}
