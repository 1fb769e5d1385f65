/** The span of values a plot along the radius shows, and where expected lies when it is not in it. */
export interface RadialDomain {
  least: number;
  most: number;
  beyond: 'above' | 'below' | null;
}

/** Expected is brought into the plot while that leaves the readings at least this share of its height. */
const LEAST_SHARE = 0.3;
const PAD = 0.06;

/**
 * The span of a plot along the radius: all readings, and expected with as much of its band as lies near. Where
 * expected is so far away that the readings would shrink to a line, it stays outside and is said to.
 *
 * Throws RangeError without a finite reading.
 */
export function radialDomain(
  readings: readonly number[],
  expected: { value: number; lower: number; upper: number } | null,
): RadialDomain {
  if (readings.length === 0 || !readings.every(Number.isFinite)) {
    throw new RangeError('A plot needs finite readings');
  }
  let [least, most] = [Math.min(...readings), Math.max(...readings)];
  const size = most - least || Math.abs(most) * 0.01 || 1;
  if (most === least) [least, most] = [least - size / 2, most + size / 2];
  const widest = size / LEAST_SHARE;
  let beyond: RadialDomain['beyond'] = null;
  if (expected !== null) {
    const reach = Math.max(most, expected.value) - Math.min(least, expected.value);
    if (reach > widest) beyond = expected.value > most ? 'above' : 'below';
    else {
      const room = (widest - reach) / 2;
      const lower = Math.max(expected.lower, Math.min(least, expected.value) - room);
      const upper = Math.min(expected.upper, Math.max(most, expected.value) + room);
      least = Math.min(least, expected.value, lower);
      most = Math.max(most, expected.value, upper);
    }
  }
  const pad = (most - least) * PAD;
  return { least: least - pad, most: most + pad, beyond };
}
