/** What is wanted of a chart: mean points between false signals, and the shift in σ that matters. */
export interface Wanted {
  inControl: number;
  shift: number;
}

/**
 * Refuses a wish that no chart fulfils sensibly: throws `RangeError` unless 10 ≤ inControl ≤ 100 000 and
 * 0.1 ≤ |shift| ≤ 6.
 */
export function assertWanted({ inControl, shift }: Wanted): void {
  if (!(inControl >= 10 && inControl <= 100_000)) {
    throw new RangeError(`between false signals from 10 to 100 000 points, not ${inControl}`);
  }
  if (!(Math.abs(shift) >= 0.1 && Math.abs(shift) <= 6)) {
    throw new RangeError(`a chart is chosen for a shift of 0.1 to 6 σ, not ${shift}`);
  }
}
