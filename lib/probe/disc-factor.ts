/** π/ln 2: sheet resistance over V/I for four pins in line on a sheet without end. */
export const INFINITE_SHEET_FACTOR = Math.PI / Math.LN2;

/**
 * How much an insulated edge lowers the geometry factor at the centre of a disc:
 * ln 2/(ln 2 + ln((r² + 3)/(r² − 3))) with r = diameter over pin spacing. Multiply π/ln 2 by it.
 *
 * Four pins in line, equally spaced, thin sheet: F. M. Smits, Bell Syst. Tech. J. 37, 711 (1958).
 * Both lengths in the same unit. Throws RangeError unless the four pins lie inside the disc (r > 3).
 *
 * @example discFactor(10, 1) // 0.9204
 */
export function discFactor(diameterMm: number, spacingMm: number): number {
  const r = diameterMm / spacingMm;
  if (!(spacingMm > 0 && r >= 3 && Number.isFinite(r))) {
    throw new RangeError(`Four pins ${spacingMm} mm apart do not fit on a disc of ${diameterMm} mm.`);
  }
  return Math.LN2 / (Math.LN2 + Math.log((r * r + 3) / (r * r - 3)));
}
