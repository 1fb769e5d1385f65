import type { ComponentProps, ReactNode } from 'react';
import styles from './field.module.css';

/** A yes or no with its words beside it, and under them what it entails. */
export function CheckField(
  props: { name: string; label: ReactNode; hint?: ReactNode; error?: string | null } & Omit<
    ComponentProps<'input'>,
    'type'
  >,
) {
  const { label, hint, error, id = props.name, ...input } = props;
  const described = [hint !== undefined && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <div className={styles.field}>
      <div className={styles.line}>
        <input
          {...input}
          id={id}
          type="checkbox"
          aria-invalid={error ? true : undefined}
          aria-describedby={described === '' ? undefined : described}
        />
        <label htmlFor={id}>{label}</label>
      </div>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="quiet small">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className={styles.error}>
          <span aria-hidden="true">◆ </span>
          {error}
        </p>
      )}
    </div>
  );
}
