/** Lengths of the primary flat by wafer diameter, mm (SEMI M1, from memory). Larger wafers carry a notch. */
const FLAT_LENGTH_MM: ReadonlyMap<number, number> = new Map([
  [100, 32.5],
  [125, 42.5],
  [150, 57.5],
]);

/**
 * How far the primary flat lies from the centre of a wafer, in mm, on the side of -y; null where the
 * diameter has no standard flat. The chord of length L on a disc of radius R: √(R² - (L/2)²).
 *
 * @example flatOffsetMm(150) // 69.27
 */
export function flatOffsetMm(diameterMm: number): number | null {
  if (!(diameterMm > 0)) throw new RangeError(`diameterMm must be positive: ${diameterMm}`);
  const lengthMm = FLAT_LENGTH_MM.get(diameterMm);
  return lengthMm === undefined ? null : Math.sqrt((diameterMm / 2) ** 2 - (lengthMm / 2) ** 2);
}
