import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { valueAt23C } from '@/lib/physics/value-at-temperature';

/** Who brought the readings to 23 °C, in words. */
export function correctedBy(correctionsApplied: readonly string[]): string {
  return correctionsApplied.includes('temperature')
    ? 'all as sent'
    : 'temperature corrected here (ASTM F84, of a layer by its own profile), the rest as sent';
}

/**
 * Readings as they count: as sent where the sender had corrected them for temperature, else brought to 23 °C by what
 * their own target says (`valueAt23C`): a resistivity by its own size, a layer by its profile or the owner's coefficient.
 * A reading that the target's model does not reach is null: files that hold one are refused, as are those of a stream
 * without a target that would need this.
 */
export function valuesAt23C(
  readings: readonly (number | null)[],
  measured: { correctionsApplied: readonly string[]; temperatureC: number | null },
  target: Target | null,
  wafer: ExpectedWafer,
): readonly (number | null)[] {
  const { temperatureC } = measured;
  if (measured.correctionsApplied.includes('temperature') || temperatureC === null) return readings;
  const share = target?.quantity === 'sheet_resistance' ? towards23C(target, 1, temperatureC, wafer) : null;
  return readings.map((reading) => {
    if (reading === null || !(reading > 0)) return reading;
    if (target === null) return null;
    // What a layer's profile makes of the temperature is the same for every reading of it.
    if (target.quantity === 'sheet_resistance') return share === null ? null : reading * share;
    return towards23C(target, reading, temperatureC, wafer);
  });
}

function towards23C(
  target: Target,
  reading: number,
  temperatureC: number,
  wafer: ExpectedWafer,
): number | null {
  try {
    return valueAt23C(target, reading, temperatureC, wafer);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
