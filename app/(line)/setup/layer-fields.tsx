import { SelectField, TextField } from '@/app/_ui/field';
import type { Target } from '@/lib/physics/target';
import { METHODS } from '@/lib/streams/target-fields';
import type { Stream } from '@/lib/streams/types';
import { LENGTH_WORDS, METHOD_WORDS } from './given-field';
import { Options } from './options';
import type { TargetChoices } from './target-choices';
import { TargetDopant, type TargetForm, TargetNumber } from './target-field';

/** What makes a layer a layer: its depth, what lies underneath, how it is measured. Nothing of a plain wafer. */
export function LayerFields(
  props: TargetForm & { kind: Stream['kind']; quantity: Target['quantity']; choices: TargetChoices },
) {
  const { kind, quantity, choices, initial, errors } = props;
  const form = { initial, errors };
  const isEpi = kind === 'epi';
  const isPlain = choices.profile === 'uniform' && !isEpi;
  const has = (name: keyof Target) => initial[name] !== undefined;
  return (
    <>
      <DepthFields {...props} hasThickness={!isPlain || quantity === 'sheet_resistance' || has('lengthUm')} />
      {(!isPlain || has('backgroundDopant')) && (
        <>
          <TargetDopant
            {...form}
            name="backgroundDopant"
            label={isEpi ? 'Dopant of the substrate' : 'Dopant underneath'}
            hint={
              isEpi
                ? 'Of the other type, or a four-point probe measures the substrate'
                : 'The layer ends where it meets the other type'
            }
            none="none"
          />
          <TargetNumber {...form} name="backgroundDensityPerCm3" label="Its density" unit="cm⁻³" />
        </>
      )}
      {(isEpi || has('method')) && (
        <SelectField
          name="method"
          label="Measured by"
          hint="A layer on its own type asks for another method"
          defaultValue={initial['method'] ?? 'four-point'}
          error={errors['method'] ?? null}
        >
          <Options words={METHOD_WORDS} order={METHODS} />
        </SelectField>
      )}
    </>
  );
}

function DepthFields(props: TargetForm & { choices: TargetChoices; hasThickness: boolean }) {
  const { choices, initial, errors } = props;
  const form = { initial, errors };
  switch (choices.profile) {
    case 'pairs':
      return (
        <TextField
          name="pairs"
          label="Profile, a line for each depth"
          hint="Depth in µm, density per cm³, from the surface down: 0.25 3.1e18"
          rows={6}
          spellCheck={false}
          defaultValue={initial['pairs'] ?? ''}
          error={errors['pairs'] ?? null}
        />
      );
    case 'implant':
      return (
        <>
          <TargetNumber {...form} name="rangeUm" label="Projected range" unit="µm" />
          <TargetNumber
            {...form}
            name="lengthUm"
            label="Straggle"
            unit="µm"
            hint="Standard deviation in depth"
          />
          <TargetNumber {...form} name="driveInC" label="Drive-in at" unit="°C" hint="Empty: as implanted" />
          <TargetNumber {...form} name="driveInMin" label="for" unit="min" />
        </>
      );
    case 'gaussian':
    case 'erfc':
      return (
        <>
          <SelectField
            key={choices.lengthNow}
            name="lengthGiven"
            label="Depth known as"
            defaultValue={choices.lengthNow}
            error={errors['lengthGiven'] ?? null}
          >
            <Options words={LENGTH_WORDS} order={choices.lengths} />
          </SelectField>
          {choices.lengthNow === 'length' ? (
            <TargetNumber
              {...form}
              name="lengthUm"
              label="Characteristic length"
              unit="µm"
              hint={choices.profile === 'erfc' ? 'L in erfc(x/L)' : 'L in exp(−(x/L)²)'}
            />
          ) : (
            <TargetNumber {...form} name="junctionUm" label="Depth of the junction" unit="µm" />
          )}
        </>
      );
    default:
      return props.hasThickness ? (
        <TargetNumber
          {...form}
          name="lengthUm"
          label="Thickness of the layer"
          unit="µm"
          hint={
            choices.profile === 'uniform' ? 'Empty: each wafer brings its own' : 'The box, over its junction'
          }
        />
      ) : null;
  }
}
