'use client';

import { useState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { formWords } from '@/app/_ui/form-state';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { ExpectedNote } from '../../expected-note';
import { typedTarget } from '@/lib/streams/typed-target';
import { RevisionFields } from '../../revision-fields';
import { ShiftNote } from '../../shift-note';
import { TargetFields } from '../../target-fields';
import { reviseTargetAction } from './target-actions';

/** A new revision of a target, begun from the one in force; what it makes physics expect is said as it is typed. */
export function TargetForm(props: {
  slug: string;
  quantity: Target['quantity'];
  /** The latest wafers, where these are charted against what is expected of them. */
  wafers: readonly ExpectedWafer[] | null;
  target: Target | null;
  now: string;
  timeZone: string;
}) {
  const { slug, quantity, wafers, target, now, timeZone } = props;
  const [typed, setTyped] = useState<Record<string, string> | null>(null);
  const parsed = typedTarget(quantity).safeParse(typed ?? wordsOf(target));
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
            hint="For wafers processed from then on, and after those on record: these keep what was expected of them."
          />
          {wafers !== null && target !== null && (
            <ShiftNote
              id="target-restart"
              before={target}
              after={parsed.success ? parsed.data : null}
              wafers={wafers}
              toolFollows
            />
          )}
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
