import { Field, SelectField } from '@/app/_ui/field';
import { CHARTED, SCREENS, STATISTICS, SUBGROUPS } from '@/lib/streams/schema';
import { Options } from '../../options';
import { CHARTED_WORDS, SCREEN_WORDS, STATISTIC_WORDS, SUBGROUP_WORDS } from '../../words';

/** What one point of a stream's charts is, and how its wafers are measured. */
export function ChartingFields({ errors }: { errors: Readonly<Record<string, string>> }) {
  const error = (name: string) => errors[name] ?? null;
  return (
    <div className="columns">
      <SelectField name="subgroup" label="One point is" defaultValue="wafer" error={error('subgroup')}>
        <Options words={SUBGROUP_WORDS} order={SUBGROUPS} />
      </SelectField>
      <Field
        name="subgroupSize"
        label="Wafers in a point"
        inputMode="numeric"
        autoComplete="off"
        defaultValue="1"
        hint="A point is judged once all of them are there"
        error={error('subgroupSize')}
      />
      <SelectField
        name="controlStatistic"
        label="Control statistic"
        defaultValue="areaMean"
        error={error('controlStatistic')}
      >
        <Options words={STATISTIC_WORDS} order={STATISTICS} />
      </SelectField>
      <SelectField
        name="chartedValue"
        label="Charted value"
        hint="The second where expected differs from wafer to wafer: crystals, mixed thickness"
        defaultValue="statistic"
        error={error('chartedValue')}
      >
        <Options words={CHARTED_WORDS} order={CHARTED} />
      </SelectField>
      <SelectField name="screening" label="Screening" defaultValue="outliers" error={error('screening')}>
        <Options words={SCREEN_WORDS} order={SCREENS} />
      </SelectField>
      <Field
        name="repeatabilityPercent"
        label="Repeatability of the gauge"
        unit="%"
        hint="One standard deviation of the same site read again"
        inputMode="decimal"
        autoComplete="off"
        defaultValue="0.2"
        error={error('repeatabilityPercent')}
      />
    </div>
  );
}
