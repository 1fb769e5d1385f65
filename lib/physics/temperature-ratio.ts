import { aroraMobility } from './arora-mobility';
import { carriers } from './carriers';
import { conductionType, type Dopant } from './dopant';

/** 23 °C, at which resistivity is quoted. */
const REFERENCE_C = 23;

function aroraConductance(dopant: Dopant, densityPerCm3: number, temperatureC: number): number {
  const temperatureK = temperatureC + 273.15;
  const isHole = conductionType(dopant) === 'p';
  const { electronsPerCm3, holesPerCm3 } = carriers(
    isHole ? 0 : densityPerCm3,
    isHole ? densityPerCm3 : 0,
    temperatureK,
  );
  return (
    electronsPerCm3 * aroraMobility('electron', densityPerCm3, temperatureK) +
    holesPerCm3 * aroraMobility('hole', densityPerCm3, temperatureK)
  );
}

/**
 * Resistivity at a temperature over that at 23 °C, of silicon with one dopant, by the ratio of the Arora model.
 *
 * Every dopant counts as ionized: against the measured coefficients near 23 °C that comes closer than with the share of
 * `ionizedFraction` at every density from 1e16 to 1e18 per cm³ (a test says by how much). From −23 °C (250 K) to 66 °C
 * (339 K). Throws RangeError outside.
 *
 * @example temperatureRatio('boron', 1e15, 50) // 1.19
 */
export function temperatureRatio(dopant: Dopant, densityPerCm3: number, temperatureC: number): number {
  return (
    aroraConductance(dopant, densityPerCm3, REFERENCE_C) /
    aroraConductance(dopant, densityPerCm3, temperatureC)
  );
}

/**
 * The slope of `temperatureRatio` at 23 °C, in percent per °C, by a central difference of ±0.5 °C: what serves where no
 * measured coefficient is published. Throws RangeError for a negative density.
 *
 * @example temperatureSlopePercentPerC('boron', 1e20) // 0.18
 */
export function temperatureSlopePercentPerC(dopant: Dopant, densityPerCm3: number): number {
  return (
    100 * (temperatureRatio(dopant, densityPerCm3, 23.5) - temperatureRatio(dopant, densityPerCm3, 22.5))
  );
}
