/**
 * The fill of one step of a map's scale, from the map's own colour variables: `share` runs from 0, the lowest
 * step, to 1, the highest; in a difference 0.5 is the pale middle.
 */
export function mapColour(share: number, mode: 'value' | 'difference'): string {
  if (!(share >= 0 && share <= 1)) throw new RangeError(`A share lies between 0 and 1: ${share}`);
  const mix = (to: string, percent: number, from: string) =>
    `color-mix(in oklab, var(${to}) ${percent.toFixed(1)}%, var(${from}))`;
  if (mode === 'value') return mix('--map-high', 100 * share, '--map-low');
  return share < 0.5
    ? mix('--map-under', 100 * (1 - 2 * share), '--map-middle')
    : mix('--map-over', 100 * (2 * share - 1), '--map-middle');
}
