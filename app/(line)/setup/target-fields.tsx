'use client';

import { CheckField } from '@/app/_ui/check-field';
import { Field, SelectField } from '@/app/_ui/field';
import { DOPANTS } from '@/lib/physics/dopant';
import type { Target } from '@/lib/physics/target';
import { PROFILES } from '@/lib/streams/target-fields';
import { Options } from './options';
import { PROFILE_WORDS } from './words';

const DOPANT_WORDS = {
  boron: 'boron (p)',
  phosphorus: 'phosphorus (n)',
  arsenic: 'arsenic (n)',
  antimony: 'antimony (n)',
};

/** A number as a person would type it: densities with an exponent, figures to ten digits. */
const text = (value: number | null | undefined) => {
  if (value == null) return '';
  const plain = String(Number(value.toPrecision(10)));
  return value >= 1e6 ? Number(plain).toExponential().replace('e+', 'e') : plain;
};

/** What a step aims at. `target` fills the fields to begin with. */
export function TargetFields(props: {
  target: Target | null;
  errors: Readonly<Record<string, string>>;
  /** The quantity is known where the stream exists. */
  quantity: Target['quantity'] | null;
}) {
  const { target, errors, quantity } = props;
  const error = (name: keyof Target) => errors[name] ?? null;
  const number = { inputMode: 'decimal', autoComplete: 'off' } as const;
  return (
    <>
      <div className="columns">
        <SelectField
          name="dopant"
          label="Dopant"
          defaultValue={target?.dopant ?? 'boron'}
          error={error('dopant')}
        >
          <Options words={DOPANT_WORDS} order={DOPANTS} />
        </SelectField>
        <Field
          name="densityPerCm3"
          label="Dopant density"
          unit="cm⁻³"
          hint="Such as 1.34e15. Of a gaussian or erfc: the peak, at the surface"
          defaultValue={text(target?.densityPerCm3)}
          error={error('densityPerCm3')}
          {...number}
        />
        <Field
          name="tolerancePercent"
          label="Tolerance of the density"
          unit="± %"
          hint="What is accepted. Empty: none agreed"
          defaultValue={text(target?.tolerancePercent)}
          error={error('tolerancePercent')}
          {...number}
        />
        <SelectField
          name="profile"
          label="Profile in depth"
          hint={quantity === 'resistivity' ? 'A graded layer has no single resistivity' : undefined}
          defaultValue={target?.profile ?? 'uniform'}
          error={error('profile')}
        >
          <Options words={PROFILE_WORDS} order={PROFILES} />
        </SelectField>
        <Field
          name="lengthUm"
          label="Thickness or length"
          unit="µm"
          hint="Of a gaussian or erfc: L in exp(−(x/L)²), erfc(x/L). Uniform, empty: each wafer brings its own"
          defaultValue={text(target?.lengthUm)}
          error={error('lengthUm')}
          {...number}
        />
        <SelectField
          name="backgroundDopant"
          label="Dopant underneath"
          defaultValue={target?.backgroundDopant ?? ''}
          error={error('backgroundDopant')}
        >
          <Options words={DOPANT_WORDS} order={DOPANTS} none="none" />
        </SelectField>
        <Field
          name="backgroundDensityPerCm3"
          label="Its density"
          unit="cm⁻³"
          defaultValue={text(target?.backgroundDensityPerCm3)}
          error={error('backgroundDensityPerCm3')}
          {...number}
        />
        <Field
          name="calibrationFactor"
          label="Calibration factor"
          hint="Measured over model. Empty: physics stands alone"
          defaultValue={text(target?.calibrationFactor)}
          error={error('calibrationFactor')}
          {...number}
        />
        <Field
          name="calibrationPercent"
          label="Its standard uncertainty"
          unit="%"
          defaultValue={text(target?.calibrationPercent)}
          error={error('calibrationPercent')}
          {...number}
        />
      </div>
      <CheckField
        name="alongCrystal"
        label="Along a crystal"
        hint="The density above is that at the seed end; each wafer's own follows from its solidified fraction (Scheil)."
        defaultChecked={target?.alongCrystal ?? false}
      />
    </>
  );
}
