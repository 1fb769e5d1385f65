import type { MobilityModel } from './conduction-resistivity';
import { conductionType, type Dopant } from './dopant';

/** Largest difference in resistivity from the 300 K fits of SP 400-64 over 1e13…1e20 per cm³, in percent. */
const SPREAD = {
  masetti: { p: 11, n: 10.1 },
  arora: { p: 8.7, n: 11.9 },
  klaassen: { p: 7.4, n: 9.5 },
} as const;

/**
 * How far a mobility model that stands in for the standard conversion strays from it, in percent of resistivity: its
 * largest difference over 1e13…1e20 per cm³ from the 300 K fits of NBS Special Publication 400-64 (recomputed in a test).
 * A bound, to be read as rectangular.
 *
 * @example modelSpreadPercent('arora', 'boron') // 8.7
 */
export function modelSpreadPercent(model: MobilityModel, dopant: Dopant): number {
  return SPREAD[model][conductionType(dopant)];
}
