import type { StripPoint } from './strip-marks';

const signed = (z: number) => `${Math.abs(z).toFixed(1)} σ ${z < 0 ? 'below' : 'above'} the centre line`;

/**
 * A strip in words, for those who hear it: how many levels, where the newest stands, how many are signals.
 *
 * @example stripWords([{ z: 3.24, signal: true }]) // "1 level; the newest 3.2 σ above the centre line; 1 signal"
 */
export function stripWords(points: readonly StripPoint[]): string {
  const levels = points.filter((point) => point.z !== null && !point.excluded);
  const newest = levels.at(-1)?.z;
  if (newest === undefined || newest === null) return 'No levels yet';
  const signals = levels.filter((point) => point.signal).length;
  const count = levels.length === 1 ? '1 level' : `${levels.length} levels`;
  const called = signals === 0 ? 'no signals' : signals === 1 ? '1 signal' : `${signals} signals`;
  return `${count}; the newest ${signed(newest)}; ${called}`;
}

/**
 * A strip without limits in words: what its levels are measured by then means nothing to a reader.
 *
 * @example unscaledWords([{ z: 0, signal: false }]) // "1 level, no limits yet"
 */
export function unscaledWords(points: readonly StripPoint[]): string {
  const count = points.filter((point) => point.z !== null && !point.excluded).length;
  return count === 0 ? 'No levels yet' : `${count === 1 ? '1 level' : `${count} levels`}, no limits yet`;
}
