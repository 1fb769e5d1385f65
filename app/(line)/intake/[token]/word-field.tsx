import { Field, SelectField } from '@/app/_ui/field';
import type { WaferColumn } from '@/lib/maps/map-columns';
import type { GivenWords } from '@/lib/maps/schema';
import type { Stream } from '@/lib/streams/types';
import { COLUMN_WORDS } from './column-words';

/** One column of a wafer-map file, asked for: streams and stages as a choice, times as a clock time of the site. */
export function WordField(props: {
  column: WaferColumn;
  given: GivenWords;
  streams: readonly Stream[];
  timeZone: string;
}) {
  const { column, given } = props;
  const { label, unit, hint, choices } = COLUMN_WORDS[column];
  const isTime = column === 'measured_at' || column === 'processed_at';
  const frame = {
    name: column,
    label,
    error: given.errors[column] ?? null,
    defaultValue: given.typed[column] ?? '',
    ...(unit === undefined ? {} : { unit }),
    ...(isTime ? { hint: `Clock time in ${props.timeZone}` } : hint === undefined ? {} : { hint }),
  };
  if (column !== 'stream' && choices === undefined) {
    const asText = !isTime || !/^$|^[\d-]+T[\d:]+$/.test(frame.defaultValue);
    return <Field {...frame} type={asText ? 'text' : 'datetime-local'} autoComplete="off" />;
  }
  const options =
    column === 'stream'
      ? props.streams.map((stream) => ({ value: stream.slug, name: stream.name }))
      : (choices ?? []).map((value) => ({ value, name: value }));
  const strange = frame.defaultValue !== '' && !options.some(({ value }) => value === frame.defaultValue);
  return (
    <SelectField {...frame}>
      <option value="">not said</option>
      {strange && <option value={frame.defaultValue}>{frame.defaultValue}</option>}
      {options.map(({ value, name }) => (
        <option key={value} value={value}>
          {name}
        </option>
      ))}
    </SelectField>
  );
}
