'use client';

import { startTransition, useActionState, useEffect, useRef, type ReactNode } from 'react';
import { Button } from './button';
import { UNSENT, type FormState } from './form-state';
import { Notice } from './notice';
import styles from './action-form.module.css';

/**
 * A form that is answered in place. What was typed stays as it was until the answer says it was taken: only then are
 * the fields made afresh. After a refusal the first field at fault has the focus.
 */
export function ActionForm(props: {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  submit: ReactNode;
  /** Said on the button while the server works. */
  working?: string;
  weight?: 'main' | 'plain';
  /** A name for screen readers. */
  label: string;
  /** Further buttons beside the first. */
  aside?: ReactNode;
  onInput?: (form: FormData) => void;
  children?: ReactNode | ((state: FormState) => ReactNode);
}) {
  const [state, dispatch, pending] = useActionState(props.action, UNSENT);
  const form = useRef<HTMLFormElement>(null);

  useEffect(() => {
    if (state.message === null) return;
    const field = form.current?.querySelector<HTMLElement>('[aria-invalid="true"]');
    (field ?? form.current?.querySelector<HTMLElement>('[role="status"]'))?.focus();
  }, [state]);

  return (
    <form
      ref={form}
      action={dispatch}
      aria-label={props.label}
      className={styles.form}
      onInput={() => form.current && props.onInput?.(new FormData(form.current))}
      onSubmit={(event) => {
        event.preventDefault();
        const sent = new FormData(event.currentTarget, (event.nativeEvent as SubmitEvent).submitter);
        if (!pending) startTransition(() => dispatch(sent));
      }}
    >
      <div key={state.taken}>
        {typeof props.children === 'function' ? props.children(state) : props.children}
      </div>
      {state.message !== null && <Notice kind="call">{state.message}</Notice>}
      {state.done !== null && <Notice kind="done">{state.done}</Notice>}
      <div className={styles.buttons}>
        <Button type="submit" weight={props.weight ?? 'main'} aria-disabled={pending}>
          {pending ? (props.working ?? 'Working…') : props.submit}
        </Button>
        {props.aside}
      </div>
    </form>
  );
}
