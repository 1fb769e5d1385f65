import { Field, SelectField } from '@/app/_ui/field';
import { KINDS, QUANTITIES } from '@/lib/streams/schema';
import { Options } from '../setup/options';
import { TargetFields } from '../setup/target-fields';
import { KIND_WORDS, QUANTITY_WORDS } from '../setup/words';
import { type BenchQuestion, type BenchWords, TEMPERATURES_C } from './bench-question';

/** What is asked of the bench: what the silicon is, and how it was measured. */
export function BenchFields(props: { first: BenchWords; words: BenchWords; question: BenchQuestion }) {
  const { first, words, question } = props;
  const { kind, quantity, target } = question;
  const number = (name: string, label: string, unit: string, hint: string) => (
    <Field
      name={name}
      label={label}
      unit={unit}
      hint={hint}
      defaultValue={first[name] ?? ''}
      inputMode="decimal"
      autoComplete="off"
    />
  );
  return (
    <>
      <div className="columns">
        <SelectField name="kind" label="What it is" defaultValue={kind}>
          <Options words={KIND_WORDS} order={KINDS} />
        </SelectField>
        {kind === 'epi' && (
          <SelectField name="quantity" label="What is measured" defaultValue={quantity}>
            <Options words={QUANTITY_WORDS} order={QUANTITIES.toReversed()} />
          </SelectField>
        )}
      </div>
      <TargetFields
        key={kind}
        initial={kind === first['kind'] || first['kind'] === undefined ? first : {}}
        words={words}
        errors={{}}
        kind={kind}
        quantity={quantity}
      />
      <details
        open={['fraction', 'measured', 'knownC', 'knownPercent'].some((name) => first[name] !== undefined)}
      >
        <summary>One wafer: its reading, and how it was measured</summary>
        <div className="columns">
          {number(
            'measured',
            'A reading at 23 °C',
            quantity === 'resistivity' ? 'Ω·cm' : 'Ω/□',
            'Held against what is expected',
          )}
          {kind === 'crystal' &&
            number('fraction', 'Its solidified fraction', '', 'From 0, the seed end, to below 1')}
          {number('knownC', 'Its temperature is known to', '°C', 'Standard uncertainty')}
          {number('knownPercent', 'Its thickness is known to', '%', 'Standard uncertainty')}
        </div>
      </details>
      <Field
        name="at"
        type="range"
        min={TEMPERATURES_C.lowest}
        max={TEMPERATURES_C.highest}
        step={0.5}
        label={`Temperature of the wafer: ${question.temperatureC} °C`}
        hint={
          target === null
            ? undefined
            : 'What is expected is at 23 °C; the curves, and the value beside them, are at this temperature'
        }
        defaultValue={question.temperatureC}
      />
    </>
  );
}
