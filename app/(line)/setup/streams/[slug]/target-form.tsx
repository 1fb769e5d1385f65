'use client';

import { useState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { formWords } from '@/app/_ui/form-state';
import type { Target } from '@/lib/physics/target';
import { ExpectedNote } from '../../expected-note';
import { RevisionFields } from '../../revision-fields';
import { TargetFields } from '../../target-fields';
import { reviseTargetAction } from './target-actions';

/** A new revision of a target, begun from the one in force; what it makes physics expect is said as it is typed. */
export function TargetForm(props: {
  slug: string;
  quantity: Target['quantity'];
  target: Target | null;
  now: string;
  timeZone: string;
}) {
  const { slug, quantity, target, now, timeZone } = props;
  const [typed, setTyped] = useState<Record<string, string> | null>(null);
  return (
    <ActionForm
      action={reviseTargetAction.bind(null, slug)}
      label="New target revision"
      submit="Record this revision"
      working="Recording it…"
      onInput={(form) => setTyped(formWords(form))}
    >
      {({ errors }) => (
        <>
          <div className="with-beside">
            <div>
              <TargetFields target={target} errors={errors} quantity={quantity} />
            </div>
            <ExpectedNote words={typed ?? wordsOf(target)} quantity={quantity} />
          </div>
          <RevisionFields
            now={now}
            timeZone={timeZone}
            errors={errors}
            hint="For wafers processed from then on; those on record stay as they were judged."
          />
        </>
      )}
    </ActionForm>
  );
}

/** A target as the fields of its form hold it. */
function wordsOf(target: Target | null): Record<string, string> {
  if (target === null) return {};
  const filled = Object.entries(target).filter(([, value]) => value !== null && value !== false);
  return Object.fromEntries(filled.map(([name, value]) => [name, String(value)]));
}
