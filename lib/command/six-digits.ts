/**
 * A figure of a table for people, to six significant digits; "—" where there is none.
 *
 * @example sixDigits(0.1 + 0.2) // '0.3'
 */
export function sixDigits(value: number | null): string {
  return value === null ? '—' : Number(value.toPrecision(6)).toString();
}
