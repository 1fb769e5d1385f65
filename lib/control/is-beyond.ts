/**
 * Whether a value lies beyond a line on the given side. A point exactly on a line is not beyond it; "exactly" allows
 * for the last bits of a double, so that 10.3 is on the line 10 + 3 × 0.1 however the sum happens to round.
 *
 * @example isBeyond(10.3, 10 + 3 * 0.1, 'above') // false
 */
export function isBeyond(value: number, line: number, side: 'above' | 'below'): boolean {
  const allowance = 8 * Number.EPSILON * Math.max(Math.abs(value), Math.abs(line));
  return side === 'above' ? value - line > allowance : line - value > allowance;
}
