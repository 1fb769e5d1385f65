/** Voltage over the inner pins and current through the outer ones, forward and, where taken, reversed. */
export interface FourPinReading {
  voltageV: number;
  currentA: number;
  voltageReverseV: number | null;
  currentReverseA: number | null;
}

/**
 * V/I in Ω of one four-pin reading: the mean of the forward and the reversed one where both were taken, which
 * cancels the thermal voltages of the contacts (ASTM F84 / SEMI MF84).
 *
 * Null where the current is zero or anything is not finite: no resistance was measured. Throws nothing.
 *
 * @example fourPinResistance({ voltageV: 2e-3, currentA: 1e-3, voltageReverseV: -2.2e-3, currentReverseA: -1e-3 }) // 2.1
 */
export function fourPinResistance(reading: FourPinReading): number | null {
  const forward = reading.voltageV / reading.currentA;
  if (!Number.isFinite(forward)) return null;
  if (reading.voltageReverseV === null || reading.currentReverseA === null) return forward;
  const reverse = reading.voltageReverseV / reading.currentReverseA;
  return Number.isFinite(reverse) ? (forward + reverse) / 2 : null;
}
