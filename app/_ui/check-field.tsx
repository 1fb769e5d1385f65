import type { ComponentProps, ReactNode } from 'react';
import styles from './field.module.css';

/** A yes or no with its words beside it, and under them what it entails. */
export function CheckField(
  props: { name: string; label: ReactNode; hint?: ReactNode } & Omit<ComponentProps<'input'>, 'type'>,
) {
  const { label, hint, id = props.name, ...input } = props;
  return (
    <div className={styles.field}>
      <div className={styles.line}>
        <input
          {...input}
          id={id}
          type="checkbox"
          aria-describedby={hint === undefined ? undefined : `${id}-hint`}
        />
        <label htmlFor={id}>{label}</label>
      </div>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="quiet small">
          {hint}
        </p>
      )}
    </div>
  );
}
