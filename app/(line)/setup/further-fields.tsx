import type { Target } from '@/lib/physics/target';
import { TargetDopant, type TargetForm, TargetNumber } from './target-field';

const NAMES = [
  'counterDopant',
  'counterDensityPerCm3',
  'temperatureCoefficientPercentPerC',
  'calibrationFactor',
  'calibrationPercent',
] as const satisfies readonly (keyof Target)[];

/** What few targets need, folded away until one does: a second dopant, a coefficient of one's own, a calibration. */
export function FurtherFields(props: TargetForm & { mayCounter: boolean }) {
  const { mayCounter, ...form } = props;
  const isOpen = NAMES.some((name) => form.initial[name] !== undefined || form.errors[name] !== undefined);
  return (
    <details open={isOpen}>
      <summary>{mayCounter ? 'Second dopant, temperature, calibration' : 'Temperature, calibration'}</summary>
      <div className="columns">
        {(mayCounter || form.initial['counterDopant'] !== undefined) && (
          <>
            <TargetDopant
              {...form}
              name="counterDopant"
              label="Second dopant"
              hint="Of the other type in the same silicon: compensated, or co-doped in the melt"
              none="none"
            />
            <TargetNumber {...form} name="counterDensityPerCm3" label="Density of the second" unit="cm⁻³" />
          </>
        )}
        <TargetNumber
          {...form}
          name="temperatureCoefficientPercentPerC"
          label="Temperature coefficient of your own"
          unit="% per °C"
          hint="Empty: that of the silicon or of the profile"
        />
        <TargetNumber
          {...form}
          name="calibrationFactor"
          label="Calibration factor"
          hint="Measured over model. Empty: physics stands alone"
        />
        <TargetNumber {...form} name="calibrationPercent" label="Its standard uncertainty" unit="%" />
      </div>
    </details>
  );
}
