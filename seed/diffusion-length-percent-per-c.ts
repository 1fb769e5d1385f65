import type { Dopant } from '@/lib/physics/dopant';

/** Boltzmann's constant in eV/K, exact in the SI of 2019. */
const BOLTZMANN_EV = 8.617333262e-5;

/** Activation energy of low-concentration diffusion in silicon, eV (textbook values, from memory). */
const ACTIVATION_EV: Readonly<Record<Dopant, number>> = {
  boron: 3.46,
  phosphorus: 3.66,
  arsenic: 4.1,
  antimony: 3.65,
};

/**
 * How much a diffusion length grows per °C of furnace temperature, in percent: the length is √(D·t) and
 * D = D0·exp(−Ea/kT), so d ln L/dT = Ea/(2·k·T²).
 *
 * @example diffusionLengthPercentPerC('phosphorus', 900) // 1.54
 */
export function diffusionLengthPercentPerC(dopant: Dopant, setPointC: number): number {
  const temperatureK = setPointC + 273.15;
  return (100 * ACTIVATION_EV[dopant]) / (2 * BOLTZMANN_EV * temperatureK ** 2);
}
