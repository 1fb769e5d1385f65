import { Field, SelectField } from '@/app/_ui/field';
import { METRICS } from '@/lib/streams/schema';
import { unitOf, type Specification, type Stream } from '@/lib/streams/types';
import { Options } from './options';
import { METRIC_WORDS } from './words';

const FIELDS = [
  { name: 'meanLower', label: 'Wafer, lower' },
  { name: 'meanUpper', label: 'Wafer, upper' },
  { name: 'siteLower', label: 'Each site, lower' },
  { name: 'siteUpper', label: 'Each site, upper' },
] as const;

/** What is accepted of a wafer: its control statistic, each of its sites, its evenness. Empty fields specify nothing. */
export function SpecificationFields(props: {
  specification: Specification | null;
  quantity: Stream['quantity'] | null;
  errors: Readonly<Record<string, string>>;
}) {
  const { specification, quantity, errors } = props;
  const unit = quantity === null ? {} : { unit: unitOf(quantity) };
  return (
    <div className="columns">
      {FIELDS.map(({ name, label }) => (
        <Field
          key={name}
          name={name}
          label={label}
          {...unit}
          inputMode="decimal"
          autoComplete="off"
          defaultValue={specification?.[name] ?? ''}
          error={errors[name] ?? null}
        />
      ))}
      <SelectField
        name="nonuniformityMetric"
        label="Evenness measured as"
        defaultValue={specification?.nonuniformityMetric ?? ''}
        error={errors['nonuniformityMetric'] ?? null}
      >
        <Options words={METRIC_WORDS} order={METRICS} none="not specified" />
      </SelectField>
      <Field
        name="nonuniformityUpper"
        label="Evenness, at most"
        unit="%"
        inputMode="decimal"
        autoComplete="off"
        defaultValue={specification?.nonuniformityUpper ?? ''}
        error={errors['nonuniformityUpper'] ?? null}
      />
    </div>
  );
}
