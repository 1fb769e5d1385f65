import type { ComponentProps } from 'react';
import { FieldNotes, type FieldWords, parted } from './field';
import styles from './field.module.css';

/** A yes or no with its words beside it, and under them what it entails. */
export function CheckField(
  props: Omit<FieldWords, 'unit'> & Omit<ComponentProps<'input'>, 'type' | keyof FieldWords>,
) {
  const { words, control } = parted(props);
  return (
    <div className={styles.field}>
      <div className={styles.line}>
        <input {...control} type="checkbox" />
        <label htmlFor={words.id}>{words.label}</label>
      </div>
      <FieldNotes words={words} />
    </div>
  );
}
