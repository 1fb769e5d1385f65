import type { Doping, MobilityModel } from './conduction-resistivity';
import { conductionType } from './dopant';
import { modelResistivity } from './model-resistivity';
import { scheilDensity } from './scheil-density';
import type { ExpectedWafer, Target } from './target';

/** The model that stands in for the standard conversion, which knows one dopant only. */
export const COMPENSATED_MODEL: MobilityModel = 'masetti';

/** Where donors and acceptors differ by less than this share of their sum, nothing can be expected. */
const LEAST_NET = 1e-3;

/** The range of densities over which the models are asked, per cm³. */
const [LIGHTEST, HEAVIEST] = [1e12, 1e21];

/** Whether a target's silicon holds a dopant of the other type as well. */
export function isCompensated(target: Target): boolean {
  return (target.counterDopant ?? null) !== null || (target.counterDensityPerCm3 ?? null) !== null;
}

/**
 * Donors and acceptors of a compensated wafer whose own dopant's density is `densityPerCm3`. Throws RangeError where
 * `counterDensity` does.
 */
export function compensatedDoping(target: Target, densityPerCm3: number, wafer: ExpectedWafer): Doping {
  const counter = counterDensity(target, wafer);
  const { dopant } = target;
  const counterDopant = target.counterDopant ?? null;
  const donor = dopant === 'boron' ? counterDopant : dopant;
  if (donor === null || donor === 'boron') throw new RangeError('A counter dopant is of the other type.');
  return dopant === 'boron'
    ? { donor, donorsPerCm3: counter, acceptorsPerCm3: densityPerCm3 }
    : { donor, donorsPerCm3: densityPerCm3, acceptorsPerCm3: counter };
}

/**
 * The counter dopant's density in a wafer, per cm³: along a crystal by its own segregation. Throws RangeError for half a
 * counter dopant, one of the dopant's own type, for a layer, and where the wafer's place along the crystal is missing.
 */
export function counterDensity(target: Target, wafer: ExpectedWafer): number {
  const [dopant, density] = [target.counterDopant ?? null, target.counterDensityPerCm3 ?? null];
  if (dopant === null || density === null) {
    throw new RangeError('A counter dopant needs both its kind and its density.');
  }
  if (conductionType(dopant) === conductionType(target.dopant)) {
    throw new RangeError(`${dopant} does not counter ${target.dopant}: both give the same type.`);
  }
  if (target.quantity !== 'resistivity' || target.profile !== 'uniform') {
    throw new RangeError('A counter dopant belongs to uniform silicon of which the resistivity is measured.');
  }
  if (!(density > 0 && Number.isFinite(density))) {
    throw new RangeError(`A dopant density is a positive number per cm³, not ${density}.`);
  }
  if (!target.alongCrystal) return density;
  const fraction = wafer.ingotFraction ?? null;
  if (fraction === null) throw new RangeError('A wafer along a crystal needs its solidified fraction.');
  return scheilDensity(dopant, density, fraction);
}

/**
 * The resistivity, in Ω·cm, of a compensated wafer whose own dopant's density is `densityPerCm3`, at 23 °C unless said.
 *
 * Throws RangeError where `counterDensity` does, outside the model, and within 0.1 % of full compensation, where the
 * smallest change of either dopant turns the type.
 */
export function compensatedResistivity(
  target: Target,
  densityPerCm3: number,
  wafer: ExpectedWafer,
  temperatureC = 23,
): number {
  const doping = compensatedDoping(target, densityPerCm3, wafer);
  const [net, total] = [
    doping.donorsPerCm3 - doping.acceptorsPerCm3,
    doping.donorsPerCm3 + doping.acceptorsPerCm3,
  ];
  if (!(densityPerCm3 > 0 && total <= HEAVIEST)) {
    throw new RangeError(
      `Compensated silicon is modelled up to ${HEAVIEST} impurities per cm³, not at ${total}.`,
    );
  }
  if (!(Math.abs(net) >= LEAST_NET * total)) {
    throw new RangeError(
      'Donors and acceptors cancel to within 0.1 %: nothing can be expected of such silicon.',
    );
  }
  return modelResistivity(COMPENSATED_MODEL, doping, temperatureC);
}

/**
 * d ln ρ/d ln N of the own dopant in compensated silicon, by a central difference that keeps well clear of the point of
 * full compensation: steeper than −1 where the own dopant leads, positive where the counter dopant does.
 */
export function compensatedSensitivity(target: Target, densityPerCm3: number, wafer: ExpectedWafer): number {
  const clear = Math.abs(1 - counterDensity(target, wafer) / densityPerCm3);
  const step = 1e-4 * Math.min(1, clear);
  const at = (share: number): number => compensatedResistivity(target, densityPerCm3 * share, wafer);
  return Math.log(at(1 + step) / at(1 - step)) / Math.log((1 + step) / (1 - step));
}

/** The densities of the own dopant that leave the type as it is at `densityPerCm3`, per cm³. */
export function compensatedLimits(
  target: Target,
  densityPerCm3: number,
  wafer: ExpectedWafer,
): { lowerPerCm3: number; upperPerCm3: number } {
  const counter = counterDensity(target, wafer);
  const edge = (1 + 1.01 * LEAST_NET) / (1 - 1.01 * LEAST_NET);
  return densityPerCm3 > counter
    ? { lowerPerCm3: counter * edge, upperPerCm3: HEAVIEST - counter }
    : { lowerPerCm3: LIGHTEST, upperPerCm3: counter / edge };
}
