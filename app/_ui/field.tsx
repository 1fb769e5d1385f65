import type { ComponentProps, ReactNode } from 'react';
import styles from './field.module.css';

export interface FieldWords {
  /** The name the form sends. */
  name: string;
  label: ReactNode;
  /** Said under the field before anything goes wrong. */
  hint?: ReactNode;
  /** What is wrong and what to do; null or absent when nothing is. */
  error?: string | null;
  unit?: string;
  /** The element's id, where a page holds two fields of one name. */
  id?: string;
}

type FieldProps<Tag extends 'input' | 'select' | 'textarea'> = FieldWords &
  Omit<ComponentProps<Tag>, keyof FieldWords>;

/** Splits what the frame says from what the control is given, and ties the two together for screen readers. */
export function parted<Props extends FieldWords>(props: Props) {
  const { label, hint, error, unit, id = props.name, ...rest } = props;
  const described = [hint !== undefined && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return {
    words: { label, hint, error, unit, id },
    control: {
      ...rest,
      id,
      'aria-invalid': error ? true : undefined,
      'aria-describedby': described === '' ? undefined : described,
    },
  };
}

function Frame({ words, children }: { words: ReturnType<typeof parted>['words']; children: ReactNode }) {
  const { label, unit, id } = words;
  return (
    <div className={styles.field}>
      <label htmlFor={id}>{label}</label>
      <div className={styles.line}>
        {children}
        {unit !== undefined && <span className="unit">{unit}</span>}
      </div>
      <FieldNotes words={words} />
    </div>
  );
}

/** What stands under a field: its hint, and what is wrong. */
export function FieldNotes({ words }: { words: ReturnType<typeof parted>['words'] }) {
  const { hint, error, id } = words;
  return (
    <>
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
    </>
  );
}

/** A labelled field of one line. */
export function Field(props: FieldProps<'input'>) {
  const { words, control } = parted(props);
  return (
    <Frame words={words}>
      <input {...control} />
    </Frame>
  );
}

/** A labelled choice; its options are the children. */
export function SelectField(props: FieldProps<'select'>) {
  const { words, control } = parted(props);
  return (
    <Frame words={words}>
      <select {...control} />
    </Frame>
  );
}

/** A labelled field of several lines. */
export function TextField(props: FieldProps<'textarea'>) {
  const { words, control } = parted(props);
  return (
    <Frame words={words}>
      <textarea rows={3} {...control} />
    </Frame>
  );
}
