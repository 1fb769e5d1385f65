import { diffusivity } from './diffusivity';
import type { Dopant } from './dopant';
import { furnaceIntrinsicDensity } from './furnace-intrinsic-density';

/** What a drive-in adds to an implant: its spread, and whether the law behind that holds at such a density. */
export interface DriveIn {
  /** Twice diffusivity times time, in µm². */
  spreadUm2: number;
  /** False where the dopant exceeds the intrinsic density at the furnace: the spread is an order of magnitude only. */
  isClassical: boolean;
  intrinsicPerCm3: number;
}

/**
 * How far a drive-in spreads a dopant: 2·D·t with the diffusivity of light doping.
 *
 * The law fails once the density exceeds the intrinsic one at the furnace's temperature; `peakPerCm3` is held against
 * it as implanted, where the drive-in begins. Throws RangeError outside 600…1250 °C and unless the time is positive.
 *
 * @example driveIn('boron', 1e18, 1000, 30).spreadUm2 // 0.0054
 */
export function driveIn(dopant: Dopant, peakPerCm3: number, temperatureC: number, minutes: number): DriveIn {
  if (!(minutes > 0 && Number.isFinite(minutes))) {
    throw new RangeError(`A drive-in takes a positive number of minutes, not ${minutes}.`);
  }
  const intrinsicPerCm3 = furnaceIntrinsicDensity(temperatureC);
  return {
    spreadUm2: 2 * diffusivity(dopant, temperatureC) * minutes * 60 * 1e8,
    isClassical: peakPerCm3 <= intrinsicPerCm3,
    intrinsicPerCm3,
  };
}
