'use client';

import { useState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { formWords } from '@/app/_ui/form-state';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { typedTarget } from '@/lib/streams/typed-target';
import type { Stream } from '@/lib/streams/types';
import { wordsOfTarget } from '@/lib/streams/words-of-target';
import { ExpectedNote } from '../../expected-note';
import { RevisionFields } from '../../revision-fields';
import { ShiftNote } from '../../shift-note';
import { TargetFields } from '../../target-fields';
import { reviseTargetAction } from './target-actions';

/** A new revision of a target, begun from the one in force; what it makes physics expect is said as it is typed. */
export function TargetForm(props: {
  slug: string;
  kind: Stream['kind'];
  quantity: Target['quantity'];
  /** The latest wafers, where these are charted against what is expected of them. */
  wafers: readonly ExpectedWafer[] | null;
  target: Target | null;
  now: string;
  timeZone: string;
}) {
  const { slug, kind, quantity, wafers, target, now, timeZone } = props;
  const [typed, setTyped] = useState<Record<string, string> | null>(null);
  const initial = target === null ? {} : { given: 'density', ...wordsOfTarget(target) };
  const words = typed ?? initial;
  const parsed = typedTarget(quantity).safeParse(words);
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
              <TargetFields initial={initial} words={words} errors={errors} kind={kind} quantity={quantity} />
            </div>
            <ExpectedNote words={words} quantity={quantity} />
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
