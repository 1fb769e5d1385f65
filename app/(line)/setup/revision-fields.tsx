import { Field } from '@/app/_ui/field';

/** Since when a revision is in force, and why it was made. */
export function RevisionFields(props: {
  now: string;
  timeZone: string;
  errors: Readonly<Record<string, string>>;
  /** What taking force entails. */
  hint?: string;
  /** Tells two such pairs on one page apart. */
  id?: string;
}) {
  const { errors, hint, id = 'revision' } = props;
  return (
    <div className="columns">
      <Field
        id={`${id}-from`}
        name="effectiveFrom"
        type="datetime-local"
        label="In force from"
        hint={`Clock time in ${props.timeZone}.${hint === undefined ? '' : ` ${hint}`}`}
        defaultValue={props.now}
        error={errors['effectiveFrom'] ?? null}
      />
      <Field
        id={`${id}-reason`}
        name="reason"
        label="Why"
        hint="Stays with the revision"
        autoComplete="off"
        error={errors['reason'] ?? null}
      />
    </div>
  );
}
