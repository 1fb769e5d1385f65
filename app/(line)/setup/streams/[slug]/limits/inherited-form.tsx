'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Beside } from '@/app/_ui/beside';
import { Field } from '@/app/_ui/field';
import { RevisionFields } from '../../../revision-fields';
import { enterInheritedAction } from './actions';

const LEVEL = [
  ['lower', 'Level, lower limit'],
  ['centre', 'Level, centre line'],
  ['upper', 'Level, upper limit'],
] as const;
const WITHIN = [
  ['withinLower', 'Within wafer, lower'],
  ['withinCentre', 'Within wafer, centre'],
  ['withinUpper', 'Within wafer, upper'],
] as const;
const BETWEEN = [
  ['betweenCentre', 'Between wafers, centre'],
  ['betweenUpper', 'Between wafers, upper'],
] as const;

/** Limits that judged this stream elsewhere, entered as a draft marked "inherited". */
export function InheritedForm(props: {
  slug: string;
  unit: string;
  hasBetween: boolean;
  now: string;
  timeZone: string;
}) {
  return (
    <Beside summary="Lower limit, centre line and upper limit from elsewhere">
      <ActionForm
        action={enterInheritedAction.bind(null, props.slug)}
        label="Enter inherited limits"
        submit="Enter them as a draft"
        working="Entering them…"
        weight="plain"
      >
        {({ errors }) => {
          const number = (name: string, label: string, unit: string, hint?: string) => (
            <Field
              key={name}
              name={name}
              label={label}
              unit={unit}
              inputMode="decimal"
              autoComplete="off"
              error={errors[name] ?? null}
              {...(hint ? { hint } : {})}
            />
          );
          return (
            <>
              <div className="columns">
                {LEVEL.map(([name, label]) => number(name, label, props.unit))}
                {number('movingRangeUpper', 'Moving range, upper', props.unit, 'Empty: it follows from σ')}
                {WITHIN.map(([name, label]) => number(name, label, '%', 'Relative s; empty: not judged'))}
                {props.hasBetween && BETWEEN.map(([name, label]) => number(name, label, props.unit))}
                {number('subgroups', 'Subgroups they came from', '', 'Empty where unknown: then provisional')}
              </div>
              <RevisionFields
                id="inherited"
                now={props.now}
                timeZone={props.timeZone}
                errors={errors}
                hint="Proposed; the approval decides."
              />
            </>
          );
        }}
      </ActionForm>
    </Beside>
  );
}
