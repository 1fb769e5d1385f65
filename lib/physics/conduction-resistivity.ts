import { aroraMobility } from './arora-mobility';
import { carriers } from './carriers';
import { klaassenMobility } from './klaassen-mobility';
import { masettiMobility } from './masetti-mobility';

/** The mobility models that may stand in for the standard conversion. */
export type MobilityModel = 'masetti' | 'arora' | 'klaassen';

/** Donors and acceptors in one piece of silicon, per cm³; boron is the acceptor. */
export interface Doping {
  donor: 'phosphorus' | 'arsenic' | 'antimony';
  donorsPerCm3: number;
  acceptorsPerCm3: number;
}

/** Elementary charge in C, exact in the SI of 2019. */
const CHARGE_C = 1.602176634e-19;

function mobilities(
  model: MobilityModel,
  doping: Doping,
  temperatureK: number,
): { electron: number; hole: number } {
  const { donor, donorsPerCm3, acceptorsPerCm3 } = doping;
  const total = donorsPerCm3 + acceptorsPerCm3;
  if (model === 'arora') {
    return {
      electron: aroraMobility('electron', total, temperatureK),
      hole: aroraMobility('hole', total, temperatureK),
    };
  }
  // Neither model has a set for antimony: that of phosphorus stands in (`mobilityNotes` says so).
  const known = donor === 'antimony' ? 'phosphorus' : donor;
  if (model === 'klaassen') {
    const scattering = {
      ...carriers(donorsPerCm3, acceptorsPerCm3, temperatureK),
      donor: known,
      donorsPerCm3,
      acceptorsPerCm3,
    };
    return {
      electron: klaassenMobility('electron', scattering, temperatureK),
      hole: klaassenMobility('hole', scattering, temperatureK),
    };
  }
  if (temperatureK !== 300)
    throw new RangeError(`The Masetti model holds at 300 K only, not at ${temperatureK}.`);
  const density = Math.max(total, 1);
  return { electron: masettiMobility(known, density), hole: masettiMobility('boron', density) };
}

/**
 * The resistivity, in Ω·cm, of silicon with donors and acceptors: ρ = 1/(q·(n·µn + p·µp)), both carriers from
 * charge neutrality and the mobility taken at the total of both impurities.
 *
 * It is what compensated silicon, and silicon near intrinsic, asks for: the net doping alone is far off there.
 * Every dopant counts as ionized; for antimony the phosphorus set stands in. Temperature in K: Masetti at 300 only, Arora 250…340, Klaassen to 340 (the
 * intrinsic density ends there). Throws RangeError outside a model's range.
 *
 * @example conductionResistivity('masetti', { donor: 'phosphorus', donorsPerCm3: 9e16, acceptorsPerCm3: 1e17 }, 300) // 2.258
 */
export function conductionResistivity(model: MobilityModel, doping: Doping, temperatureK: number): number {
  const { electronsPerCm3, holesPerCm3 } = carriers(
    doping.donorsPerCm3,
    doping.acceptorsPerCm3,
    temperatureK,
  );
  const { electron, hole } = mobilities(model, doping, temperatureK);
  return 1 / (CHARGE_C * (electronsPerCm3 * electron + holesPerCm3 * hole));
}
