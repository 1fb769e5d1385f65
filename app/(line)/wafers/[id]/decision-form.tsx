'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { SelectField, TextField } from '@/app/_ui/field';
import { decide } from './actions';
import type { DecisionChoice } from './decision-choices';

const GROUPS = [
  { action: 'in', label: 'Put back' },
  { action: 'out', label: 'Take out' },
] as const;

/** A person's word on one reading, with the reason that stays beside it. */
export function DecisionForm(props: { waferId: string; choices: readonly DecisionChoice[]; chosen: string }) {
  return (
    <ActionForm
      action={decide.bind(null, props.waferId)}
      label="Take a reading out, or put one back"
      submit="Record the decision"
      working="Measuring and judging again…"
      weight="plain"
    >
      {(state) => (
        <>
          <SelectField
            name="site"
            label="Reading"
            defaultValue={props.chosen}
            error={state.errors['site'] ?? null}
            hint="The reading itself stays on record. The wafer is measured again, and its stream judged again from there."
          >
            <option value="">Choose a reading</option>
            {GROUPS.map(({ action, label }) => {
              const own = props.choices.filter((choice) => choice.action === action);
              return own.length === 0 ? null : (
                <optgroup key={action} label={label}>
                  {own.map((choice) => (
                    <option key={choice.value} value={choice.value}>
                      {label}: {choice.label}
                    </option>
                  ))}
                </optgroup>
              );
            })}
          </SelectField>
          <TextField
            name="reason"
            label="Reason"
            rows={2}
            maxLength={500}
            error={state.errors['reason'] ?? null}
            hint="Kept with your name and the time."
          />
        </>
      )}
    </ActionForm>
  );
}
