import { conductionResistivity, type Doping, type MobilityModel } from './conduction-resistivity';

/**
 * The resistivity, in Ω·cm, of silicon with donors and acceptors by a mobility model at a temperature in °C: at its own
 * temperatures outright; the Masetti model, which holds at 300 K, moved from there by the ratio of the Arora model.
 *
 * Throws RangeError outside the models' ranges, −23…66 °C.
 *
 * @example modelResistivity('masetti', { donor: 'phosphorus', donorsPerCm3: 9e16, acceptorsPerCm3: 1e17 }, 26.85) // 2.258
 */
export function modelResistivity(model: MobilityModel, doping: Doping, temperatureC: number): number {
  const temperatureK = temperatureC + 273.15;
  if (model !== 'masetti' || temperatureK === 300) return conductionResistivity(model, doping, temperatureK);
  const moved =
    conductionResistivity('arora', doping, temperatureK) / conductionResistivity('arora', doping, 300);
  return conductionResistivity('masetti', doping, 300) * moved;
}
