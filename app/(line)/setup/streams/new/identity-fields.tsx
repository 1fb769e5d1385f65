import { Field, SelectField } from '@/app/_ui/field';
import { KINDS, QUANTITIES } from '@/lib/streams/schema';
import { slugOf } from '@/lib/streams/slug-of';
import { Options } from '../../options';
import { KIND_WORDS, QUANTITY_WORDS } from '../../words';

/** What a stream is: its name, its place on the line, what is measured and where. */
export function IdentityFields(props: {
  errors: Readonly<Record<string, string>>;
  plans: readonly { id: string; name: string }[];
  /** The name as it is typed now, to suggest the one for files. */
  name: string;
}) {
  const { errors, plans } = props;
  const error = (name: string) => errors[name] ?? null;
  const words = (name: string, label: string, hint?: string) => (
    <Field name={name} label={label} autoComplete="off" error={error(name)} {...(hint ? { hint } : {})} />
  );
  const suggested = slugOf(props.name);
  return (
    <div className="columns">
      {words('name', 'Name', 'As people say it: “N-epi 5.6 Ω·cm, reactor 2”')}
      {words(
        'slug',
        'Name in files and addresses',
        suggested === '' ? 'Small letters, digits, hyphens' : `Left empty: ${suggested}`,
      )}
      <SelectField name="kind" label="What it makes" defaultValue="substrate" error={error('kind')}>
        <Options words={KIND_WORDS} order={KINDS} />
      </SelectField>
      {words('step', 'Step')}
      {words('tool', 'Tool')}
      {words('chamber', 'Chamber', 'Empty where the tool has one')}
      {words('recipe', 'Recipe')}
      <SelectField
        name="quantity"
        label="What is measured"
        defaultValue="resistivity"
        error={error('quantity')}
      >
        <Options words={QUANTITY_WORDS} order={QUANTITIES} />
      </SelectField>
      <SelectField name="sitePlanId" label="Site plan" defaultValue="" error={error('sitePlanId')}>
        <Options
          none="choose one"
          words={Object.fromEntries(plans.map(({ id, name }) => [id, name]))}
          order={plans.map(({ id }) => id)}
        />
      </SelectField>
    </div>
  );
}
