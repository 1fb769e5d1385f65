import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';
import type { AskedSpan } from './asked-span';

/** The choice of a span of subgroups. It goes into the address. */
export function SpanForm(props: {
  typed: AskedSpan['typed'];
  errors: AskedSpan['errors'];
  timeZone: string;
  submit: string;
  anchor: string;
}) {
  const { typed, errors } = props;
  return (
    <form
      method="get"
      action={`#${props.anchor}`}
      aria-label="Span of subgroups"
      key={JSON.stringify(typed)}
      style={{ margin: '8px 0 16px' }}
    >
      <div className="columns" style={{ maxWidth: 900 }}>
        <Field
          id="span-from"
          name="from"
          type="datetime-local"
          label="Subgroups processed from"
          hint={`Clock time in ${props.timeZone}`}
          defaultValue={typed.from}
          error={errors['from'] ?? null}
        />
        <Field
          id="span-to"
          name="to"
          type="datetime-local"
          label="to, this minute included"
          defaultValue={typed.to}
          error={errors['to'] ?? null}
        />
      </div>
      <Button type="submit">{props.submit}</Button>
    </form>
  );
}
