import { conductionType, type Dopant } from './dopant';
import type { Doping } from './conduction-resistivity';
import { monotoneRoot } from './monotone-root';
import { scheilDensity } from './scheil-density';

/** One dopant of a melt by the density it gives the seed end of the crystal, per cm³. */
export interface MeltDopant {
  dopant: Dopant;
  seedDensityPerCm3: number;
}

/** What a crystal from a melt of several dopants holds at one place. */
export interface CodopedPlace extends Doping {
  fraction: number;
  type: 'n' | 'p' | 'intrinsic';
  /** Donors less acceptors, without sign. */
  netDensityPerCm3: number;
}

/**
 * Donors and acceptors at a solidified fraction of a crystal whose melt held several dopants: each follows Scheil's law
 * by itself. Where donors of several kinds meet, `donor` names the heaviest of them there.
 *
 * Throws RangeError unless 0 ≤ fraction < 1 and the densities are positive, and for a melt of nothing.
 *
 * @example codopedPlace([boron 1e16, phosphorus 5e15], 0.5).type // 'p'
 */
export function codopedPlace(melt: readonly MeltDopant[], fraction: number): CodopedPlace {
  if (melt.length === 0) throw new RangeError('A doped melt holds a dopant.');
  let [donorsPerCm3, acceptorsPerCm3, heaviest] = [0, 0, 0];
  let donor: Doping['donor'] = 'phosphorus';
  for (const { dopant, seedDensityPerCm3 } of melt) {
    const density = scheilDensity(dopant, seedDensityPerCm3, fraction);
    if (dopant === 'boron') acceptorsPerCm3 += density;
    else donorsPerCm3 += density;
    if (dopant !== 'boron' && density > heaviest) [donor, heaviest] = [dopant, density];
  }
  const net = donorsPerCm3 - acceptorsPerCm3;
  return {
    fraction,
    donor,
    donorsPerCm3,
    acceptorsPerCm3,
    type: net === 0 ? 'intrinsic' : net > 0 ? 'n' : 'p',
    netDensityPerCm3: Math.abs(net),
  };
}

/**
 * The solidified fraction at which a crystal changes from p- to n-type, or null where it never does. Donors pile up in
 * the melt faster than boron, so a crystal turns at most once, and never back.
 *
 * Of one donor against boron: (1 − g)^(kB − kD) = ND/NB at the seed end (Scheil's law for both). Throws RangeError where
 * `codopedPlace` does.
 *
 * @example typeChangeFraction([boron 1e16, phosphorus 5e15]) // 0.786
 */
export function typeChangeFraction(melt: readonly MeltDopant[]): number | null {
  const isBoth =
    melt.some(({ dopant }) => conductionType(dopant) === 'n') &&
    melt.some(({ dopant }) => dopant === 'boron');
  if (!isBoth || codopedPlace(melt, 0).type !== 'p') return null;
  // x = −ln(1 − g): the logarithms of both sides are straight in it, or nearly so.
  const excess = (x: number): number => {
    const { donorsPerCm3, acceptorsPerCm3 } = codopedPlace(melt, -Math.expm1(-x));
    return Math.log(donorsPerCm3 / acceptorsPerCm3);
  };
  const x = monotoneRoot(excess, 0, 30, 1e-14);
  return x === null ? null : -Math.expm1(-x);
}
