import { Field, SelectField } from '@/app/_ui/field';
import { DOPANTS } from '@/lib/physics/dopant';
import type { TargetFields } from '@/lib/streams/target-fields';
import { Options } from './options';

const DOPANT_WORDS = {
  boron: 'boron (p)',
  phosphorus: 'phosphorus (n)',
  arsenic: 'arsenic (n)',
  antimony: 'antimony (n)',
};

/** What every field of a target's form draws from. */
export interface TargetForm {
  /** What fills the fields to begin with. */
  initial: Readonly<Record<string, string>>;
  errors: Readonly<Record<string, string>>;
}

/** A number as a person would type it: densities with an exponent, figures to ten digits. */
function typedText(word: string | undefined): string {
  const value = Number(word);
  if (word === undefined || word === '' || !Number.isFinite(value)) return word ?? '';
  const plain = Number(value.toPrecision(10));
  return Math.abs(value) >= 1e6 ? plain.toExponential().replace('e+', 'e') : String(plain);
}

/** A number of a target. */
export function TargetNumber(
  props: TargetForm & { name: keyof TargetFields; label: string; unit?: string; hint?: string },
) {
  const { initial, errors, name, ...words } = props;
  return (
    <Field
      {...words}
      name={name}
      defaultValue={typedText(initial[name])}
      error={errors[name] ?? null}
      inputMode="decimal"
      autoComplete="off"
    />
  );
}

/** A dopant of a target; with `none` there may be no such dopant. */
export function TargetDopant(
  props: TargetForm & { name: keyof TargetFields; label: string; hint?: string; none?: string },
) {
  const { initial, errors, name, none, ...words } = props;
  return (
    <SelectField
      {...words}
      name={name}
      defaultValue={initial[name] ?? (none === undefined ? 'boron' : '')}
      error={errors[name] ?? null}
    >
      <Options words={DOPANT_WORDS} order={DOPANTS} {...(none === undefined ? {} : { none })} />
    </SelectField>
  );
}
