import { codopedPlace, type CodopedPlace, type MeltDopant } from './codoped-crystal';
import { conductionResistivity, type MobilityModel } from './conduction-resistivity';
import { standardResistivity } from './standard-resistivity';

/** What physics expects at one place along a crystal; the resistivity in Ω·cm is null beyond the conversion or model. */
export interface CrystalPlace extends CodopedPlace {
  resistivityOhmCm: number | null;
}

function resistivityAt(melt: readonly MeltDopant[], place: CodopedPlace, model: MobilityModel): number {
  const [only] = melt;
  if (melt.length === 1 && only !== undefined) {
    return standardResistivity(only.dopant, place.netDensityPerCm3);
  }
  return conductionResistivity(model, place, 300);
}

/**
 * Expected resistivity against solidified fraction, the curve on which the wafers of a crystal lie: of one dopant by the
 * standard conversion at 23 °C; of a co-doped melt by a mobility model at the total doping and 300 K, with both
 * carriers, up to a peak where donors and acceptors meet (`typeChangeFraction`).
 *
 * Throws RangeError for fractions outside 0…1 and densities that are not positive.
 *
 * @example crystalCurve([phosphorus 1e15], [0, 0.5], 'masetti')[1].resistivityOhmCm // 2.907
 */
export function crystalCurve(
  melt: readonly MeltDopant[],
  fractions: readonly number[],
  model: MobilityModel,
): CrystalPlace[] {
  return fractions.map((fraction) => {
    const place = codopedPlace(melt, fraction);
    try {
      return { ...place, resistivityOhmCm: resistivityAt(melt, place, model) };
    } catch (error) {
      if (error instanceof RangeError) return { ...place, resistivityOhmCm: null };
      throw error;
    }
  });
}
