import type { Carriers } from './carriers';
import type { Doping } from './conduction-resistivity';
import { intrinsicDensity } from './intrinsic-density';
import { ionizationTerms } from './ionization-terms';
import { monotoneRoot } from './monotone-root';

/** Carriers, and the share of donors and of acceptors that gave them; null where there are none of a kind. */
export interface IonizedCarriers extends Carriers {
  ionizedDonors: number | null;
  ionizedAcceptors: number | null;
}

/**
 * Electrons and holes where not every dopant is ionized: n + Na⁻ = p + Nd⁺ with n·p = ni², each dopant's share by the
 * model of `ionizationTerms` at its own density.
 *
 * For carrier densities only, never for a resistivity of the standard conversion, which holds it already. Temperature
 * in K, 78…340. Null for antimony, for which no set is published. Throws RangeError for negative densities and outside
 * the temperatures.
 *
 * @example ionizedCarriers({ donor: 'phosphorus', donorsPerCm3: 1e18, acceptorsPerCm3: 0 }, 300)?.ionizedDonors // 0.791
 */
export function ionizedCarriers(doping: Doping, temperatureK: number): IonizedCarriers | null {
  const { donor, donorsPerCm3: donors, acceptorsPerCm3: acceptors } = doping;
  if (!(donors >= 0 && acceptors >= 0 && Number.isFinite(donors + acceptors))) {
    throw new RangeError(`Dopant densities are not negative; they are ${donors} and ${acceptors}.`);
  }
  const intrinsic = intrinsicDensity(temperatureK);
  if (donors > 0 && donor === 'antimony') return null;
  const ofDonors = donors === 0 ? null : ionizationTerms(donor, donors, temperatureK);
  const ofAcceptors = acceptors === 0 ? null : ionizationTerms('boron', acceptors, temperatureK);
  const share = (terms: { bound: number; levelPerCm3: number }, carriers: number): number =>
    1 - (terms.bound * carriers) / (carriers + terms.levelPerCm3);
  const donorShare = (n: number): number => (ofDonors === null ? 0 : share(ofDonors, n));
  const acceptorShare = (p: number): number => (ofAcceptors === null ? 0 : share(ofAcceptors, p));
  // x = ln(n/ni): both carriers keep their digits, and the excess charge rises with x.
  const excess = (x: number): number => {
    const [n, p] = [intrinsic * Math.exp(x), intrinsic * Math.exp(-x)];
    return n - p + acceptors * acceptorShare(p) - donors * donorShare(n);
  };
  const reach = Math.log((donors + acceptors) / intrinsic + 2);
  const x = monotoneRoot(excess, -reach, reach, 1e-15) ?? 0;
  const [electronsPerCm3, holesPerCm3] = [intrinsic * Math.exp(x), intrinsic * Math.exp(-x)];
  return {
    electronsPerCm3,
    holesPerCm3,
    ionizedDonors: ofDonors === null ? null : donorShare(electronsPerCm3),
    ionizedAcceptors: ofAcceptors === null ? null : acceptorShare(holesPerCm3),
  };
}
