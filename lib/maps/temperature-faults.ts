import { isNear23C } from '@/lib/physics/temperature-coefficient';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { valueAt23C } from '@/lib/physics/value-at-temperature';

/** Why a reading cannot be brought to 23 °C; `row` is null where none of them can. */
export interface TemperatureFault {
  row: number | null;
  reason: string;
}

/**
 * The readings that a target cannot bring to 23 °C, in physics' own words. What is zero or negative is no reading
 * anyway. A layer, and a wafer outside 18 to 28 °C, go by the target alone: then all can or none.
 */
export function temperatureFaults(
  target: Target,
  values: readonly (number | null)[],
  temperatureC: number,
  wafer: ExpectedWafer,
): TemperatureFault[] {
  if (target.quantity === 'sheet_resistance' || !isNear23C(temperatureC)) {
    const reason = faultOf(target, 1, temperatureC, wafer);
    return reason === null ? [] : [{ row: null, reason }];
  }
  return [...values.entries()].flatMap(([row, value]) => {
    if (typeof value !== 'number' || !(value > 0)) return [];
    const reason = faultOf(target, value, temperatureC, wafer);
    return reason === null ? [] : [{ row, reason }];
  });
}

function faultOf(target: Target, value: number, temperatureC: number, wafer: ExpectedWafer): string | null {
  try {
    valueAt23C(target, value, temperatureC, wafer);
    return null;
  } catch (error) {
    if (error instanceof RangeError) return `${error.message} Correct it at the gauge.`;
    throw error;
  }
}
