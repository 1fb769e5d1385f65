import { Field, SelectField, TextField } from '@/app/_ui/field';
import { PLAN_SHAPES } from '@/lib/streams/planned-sites';
import { Options } from '../../options';

const SHAPES = {
  polar: 'rings: centre and 8, 16, 24… sites',
  cross: 'cross on the axes',
  scan: 'diameter scan',
  lattice: 'square lattice',
  list: 'a list of my own',
};
const ORIENTATIONS = { notch: 'notch', flat: 'flat' };
const ARMS = { '5': '5 sites, halfway out', '9': '9 sites, halfway and at the radius' };

/** What the form holds before anything is typed. */
export const PLAN_BEGINNING = {
  shape: 'polar',
  diameterMm: '200',
  edgeExclusionMm: '5',
  orientation: 'notch',
  outerRadiusMm: '93',
  rings: '3',
  arms: '9',
  count: '49',
  angleDegrees: '0',
  pitchMm: '20',
};

/** The figures of a plan: its wafer, and what its shape asks for. */
export function PlanFields({ errors, shape }: { errors: Readonly<Record<string, string>>; shape: string }) {
  const number = (name: keyof typeof PLAN_BEGINNING, label: string, unit: string, hint?: string) => (
    <Field
      key={name}
      name={name}
      label={label}
      unit={unit}
      inputMode="decimal"
      autoComplete="off"
      defaultValue={PLAN_BEGINNING[name]}
      error={errors[name] ?? null}
      {...(hint ? { hint } : {})}
    />
  );
  return (
    <>
      <div className="columns">
        <Field
          name="name"
          label="Name"
          hint="Such as “49 sites, 200 mm”"
          autoComplete="off"
          error={errors['name'] ?? null}
        />
        {number('diameterMm', 'Wafer diameter', 'mm')}
        {number(
          'edgeExclusionMm',
          'Edge exclusion',
          'mm',
          'Sites within it are drawn and left out of the figures',
        )}
        <SelectField
          name="orientation"
          label="Mark at the bottom"
          defaultValue={PLAN_BEGINNING.orientation}
          error={errors['orientation'] ?? null}
        >
          <Options words={ORIENTATIONS} order={['notch', 'flat']} />
        </SelectField>
        <SelectField
          name="shape"
          label="How the sites lie"
          defaultValue={PLAN_BEGINNING.shape}
          error={errors['shape'] ?? null}
        >
          <Options words={SHAPES} order={PLAN_SHAPES} />
        </SelectField>
        {shape !== 'list' && number('outerRadiusMm', 'Out to a radius of', 'mm')}
        {shape === 'polar' && number('rings', 'Rings', '', '1: 9 sites, 2: 25, 3: 49, 4: 81, 5: 121')}
        {shape === 'cross' && (
          <SelectField name="arms" label="Sites" defaultValue="9" error={errors['arms'] ?? null}>
            <Options words={ARMS} order={['5', '9']} />
          </SelectField>
        )}
        {shape === 'scan' && number('count', 'Sites', '', 'At least 25; an odd number has one in the centre')}
        {shape === 'scan' && number('angleDegrees', 'Turned by', '°', 'Counter-clockwise from +x')}
        {shape === 'lattice' && number('pitchMm', 'Pitch', 'mm')}
      </div>
      {shape === 'list' && (
        <TextField
          name="list"
          label="Sites, a line “x, y” in mm for each"
          hint="From the wafer's centre, +y away from the notch. Paste from a spreadsheet if you like"
          rows={10}
          error={errors['list'] ?? null}
        />
      )}
    </>
  );
}
