'use client';

import type { Target } from '@/lib/physics/target';
import { typedTarget } from '@/lib/streams/typed-target';
import { ExpectedFigures } from './expected-figures';
import { GIVEN_FIELD } from '@/lib/streams/target-of-fields';
import styles from './expected-note.module.css';

/** What physics expects of the target that stands in a form's fields now; said while it is typed. */
export function ExpectedNote(props: {
  words: Readonly<Record<string, FormDataEntryValue>>;
  quantity: Target['quantity'];
}) {
  const parsed = typedTarget(props.quantity).safeParse(props.words);
  if (!parsed.success) {
    const begun = Object.values(GIVEN_FIELD).some((name) => String(props.words[name] ?? '').trim() !== '');
    return (
      <section className={styles.note} aria-label="Expected value">
        <p className="phys">Expected</p>
        <p aria-live="polite">
          {begun
            ? `Nothing yet: ${parsed.error.issues[0]?.message ?? ''}`
            : 'Type what is known of the dopant: what a wafer should read then stands here.'}
        </p>
      </section>
    );
  }
  return (
    <section className={styles.note} aria-label="Expected value">
      <ExpectedFigures target={parsed.data} />
    </section>
  );
}
