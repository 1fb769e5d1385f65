import type { Dopant } from './dopant';

/** Boltzmann's constant in eV/K, exact in the SI of 2019. */
const BOLTZMANN_EV = 8.617333262e-5;

/** Prefactor in cm²/s and activation energy in eV at low density (textbook values, from memory). */
const LAW: Readonly<Record<Dopant, { cm2PerS: number; activationEv: number }>> = {
  boron: { cm2PerS: 0.76, activationEv: 3.46 },
  phosphorus: { cm2PerS: 3.85, activationEv: 3.66 },
  arsenic: { cm2PerS: 22.9, activationEv: 4.1 },
  antimony: { cm2PerS: 0.214, activationEv: 3.65 },
};

function checkedKelvin(temperatureC: number): number {
  if (!(temperatureC >= 600 && temperatureC <= 1250)) {
    throw new RangeError(`A furnace works from 600 to 1250 °C here, not at ${temperatureC}.`);
  }
  return temperatureC + 273.15;
}

/**
 * How fast a dopant spreads in silicon, in cm²/s, at a furnace temperature in °C: D0·exp(−Ea/kT), for densities below
 * the intrinsic one there (`furnaceIntrinsicDensity`). Throws RangeError outside 600…1250 °C.
 *
 * @example diffusivity('boron', 1000) // 1.5e-14
 */
export function diffusivity(dopant: Dopant, temperatureC: number): number {
  const { cm2PerS, activationEv } = LAW[dopant];
  return cm2PerS * Math.exp(-activationEv / (BOLTZMANN_EV * checkedKelvin(temperatureC)));
}

/**
 * How much faster a dopant spreads per °C of furnace temperature: d ln D/dT = Ea/(k·T²), per °C. A length √(D·t) grows
 * by half of it. Throws RangeError outside 600…1250 °C.
 *
 * @example diffusivityGrowthPerC('phosphorus', 900) // 0.0309
 */
export function diffusivityGrowthPerC(dopant: Dopant, temperatureC: number): number {
  return LAW[dopant].activationEv / (BOLTZMANN_EV * checkedKelvin(temperatureC) ** 2);
}
