'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Button } from '@/app/_ui/button';
import { TextField } from '@/app/_ui/field';
import type { FormState } from '@/app/_ui/form-state';
import type { ExcursionState } from '@/lib/excursions/types';
import type { CaseStep } from './case-steps';

type Action = (state: FormState, form: FormData) => Promise<FormState>;

const WORDS: Record<CaseStep, string> = {
  acknowledged: 'Acknowledge',
  'under-investigation': 'Investigate',
  noted: 'Add the note',
};

/** Answers an excursion: says that someone looks after it, or adds what was found. */
export function AnswerForm(props: {
  action: Action;
  state: ExcursionState;
  /** The steps that are open; the first is the one the case waits for. */
  steps: readonly [CaseStep, ...CaseStep[]];
}) {
  const { action, state } = props;
  const [first, ...others] = props.steps;
  return (
    <ActionForm
      action={action}
      label="Answer this excursion"
      submit={WORDS[first]}
      weight={state === 'open' ? 'main' : 'plain'}
      aside={others.map((step) => (
        <Button key={step} type="submit" name="to" value={step}>
          {WORDS[step]}
        </Button>
      ))}
    >
      {(sent) => (
        <>
          <input type="hidden" name="to" value={first} />
          <TextField
            name="note"
            id="answer-note"
            label="Note"
            hint={state === 'open' ? 'What you saw, what you will do; may stay empty.' : undefined}
            maxLength={2000}
            error={sent.errors.note ?? null}
          />
        </>
      )}
    </ActionForm>
  );
}
