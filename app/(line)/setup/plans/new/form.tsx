'use client';

import { useState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { formWords } from '@/app/_ui/form-state';
import { newSitePlan } from '@/lib/streams/planned-sites';
import { createPlanAction } from './actions';
import { PlanFields, PLAN_BEGINNING } from './plan-fields';
import { PlanPreview } from './plan-preview';

/** A new site plan; its sites are drawn as its figures are typed. */
export function NewPlanForm() {
  const [words, setWords] = useState<Record<string, string>>(PLAN_BEGINNING);
  const parsed = newSitePlan.safeParse({ ...words, name: words['name'] || 'unnamed' });
  return (
    <div className="with-beside">
      <ActionForm
        action={createPlanAction}
        label="New site plan"
        submit="Keep this plan"
        working="Keeping it…"
        onInput={(form) => setWords(formWords(form))}
      >
        {({ errors }) => <PlanFields errors={errors} shape={words['shape'] ?? 'polar'} />}
      </ActionForm>
      <PlanPreview
        plan={parsed.success ? parsed.data : null}
        fault={parsed.success ? null : (parsed.error.issues[0]?.message ?? '')}
      />
    </div>
  );
}
