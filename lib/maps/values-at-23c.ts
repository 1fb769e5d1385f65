import { conductionType } from '@/lib/physics/dopant';
import { resistivityAt23C } from '@/lib/physics/temperature-coefficient';
import type { Target } from '@/lib/physics/target';

/** Who brought the readings to 23 °C, in words. */
export function correctedBy(correctionsApplied: readonly string[]): string {
  return correctionsApplied.includes('temperature')
    ? 'all as sent'
    : 'temperature corrected here (ASTM F84), the rest as sent';
}

/**
 * Readings as they count: as sent where the sender had corrected them for temperature, else brought to 23 °C by the
 * coefficient of uniform silicon (ASTM F84). A reading beyond the coefficient's range is null: files that
 * hold one are refused.
 */
export function valuesAt23C(
  readings: readonly (number | null)[],
  measured: { correctionsApplied: readonly string[]; temperatureC: number | null },
  target: Target | null,
): readonly (number | null)[] {
  if (measured.correctionsApplied.includes('temperature') || measured.temperatureC === null) return readings;
  // A wafer of a stream without a target is refused where it would need this.
  const type = target === null ? 'n' : conductionType(target.dopant);
  const temperatureC = measured.temperatureC;
  return readings.map((reading) => {
    if (reading === null || !(reading > 0)) return reading;
    try {
      return resistivityAt23C(type, reading, temperatureC);
    } catch (error) {
      if (error instanceof RangeError) return null;
      throw error;
    }
  });
}
