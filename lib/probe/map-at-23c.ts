import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { valueAt23C } from '@/lib/physics/value-at-temperature';
import type { Place } from './disc-transfer-resistance';
import { siteFactors, type ProbeGeometry } from './site-factors';

/**
 * The resistances V/I of a map as the values of its target at 23 °C: sheet resistance in Ω/□ by the factors of the
 * sites, or resistivity in Ω·cm by the thickness as well, then moved from the wafer's temperature
 * (ρ23 = (V/I)·w·(π/ln 2)·F(S/D)·F(w/S)·Fsp·F_T, ASTM F84 / SEMI MF84).
 *
 * `resistancesOhm` one for each site, null where none was taken. Null too off the disc and where the temperature
 * correction ends for a reading. Throws RangeError for a geometry that cannot be, and for a resistivity without a
 * thickness.
 */
export function mapAt23C(
  target: Target,
  sites: readonly Place[],
  resistancesOhm: readonly (number | null)[],
  geometry: ProbeGeometry,
  temperatureC: number,
  wafer: ExpectedWafer = {},
): (number | null)[] {
  const isResistivity = target.quantity === 'resistivity';
  if (isResistivity && geometry.thicknessUm === null) {
    throw new RangeError('A resistivity needs the thickness of the wafer.');
  }
  if (resistancesOhm.length !== sites.length) {
    throw new RangeError(`There are ${sites.length} sites and ${resistancesOhm.length} resistances.`);
  }
  const thickness = isResistivity ? (geometry.thicknessUm ?? 0) * 1e-4 : 1;
  // The coefficient of a layer is that of its profile, the same at every site.
  const layerFactor = isResistivity ? null : valueAt23C(target, 1, temperatureC, wafer);
  return siteFactors(sites, geometry).map((factor, site) => {
    const resistance = resistancesOhm[site] ?? null;
    if (factor === null || resistance === null) return null;
    const value = resistance * factor * thickness;
    if (layerFactor !== null) return value * layerFactor;
    return resistivityOrNull(target, value, temperatureC, wafer);
  });
}

function resistivityOrNull(
  target: Target,
  value: number,
  temperatureC: number,
  wafer: ExpectedWafer,
): number | null {
  try {
    return valueAt23C(target, value, temperatureC, wafer);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
